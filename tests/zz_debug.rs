#[test]
fn debug() {
    let text = std::fs::read_to_string("/tmp/lw/m16.toml").unwrap();
    let model = lengthwise::job::read(&text).unwrap();
    let s = lengthwise::solve::member(&model, &model.members[0], &model.combinations[0]).unwrap();
    for st in &s.member.stations {
        println!(
            "{} u={:e} b={:?} a={:?}",
            st.name,
            st.displacement.value,
            st.force_before.map(|f| f.value),
            st.force_after.map(|f| f.value)
        );
    }
    for st in &s.member.supports {
        println!(
            "{} R={:?} gap={:?} bears={:?}",
            st.name,
            st.reaction.map(|f| f.value),
            st.gap.map(|f| f.value),
            st.bears
        );
    }
    for st in &s.member.segments {
        println!(
            "{} e={:?} gap={:?} bears={:?}",
            st.name,
            st.elongation.value,
            st.gap.map(|f| f.value),
            st.bears
        );
    }
    println!(
        "{:?}",
        lengthwise::proof::member(&model, &model.members[0], &model.combinations[0], &s.member)
    );
}
