//! The nearest of the names that would have been right.

/// The candidate that is meant in all likelihood: few letters changed, left out, put in or swapped,
/// or the same letters in another case. `None` where nothing comes near.
pub(crate) fn nearest<'c>(
    written: &str,
    candidates: impl IntoIterator<Item = &'c str>,
) -> Option<&'c str> {
    all_nearest(written, candidates).first().copied()
}

/// All candidates that come equally near.
fn all_nearest<'c>(written: &str, candidates: impl IntoIterator<Item = &'c str>) -> Vec<&'c str> {
    let length = written.chars().count();
    if length == 0 || length > 64 {
        return Vec::new();
    }
    let written_low = written.to_lowercase();
    let allowed = (length / 3).clamp(1, 3);
    let near: Vec<(usize, &str)> = candidates
        .into_iter()
        .filter(|candidate| !candidate.is_empty())
        .filter_map(|candidate| {
            let low = candidate.to_lowercase();
            if low.chars().count().abs_diff(length) > allowed {
                return None;
            }
            let distance = distance(&written_low, &low);
            let (shortest, longest) = {
                let other = low.chars().count();
                (length.min(other), length.max(other))
            };
            // A word of which no letter is left is another word, also where it is short.
            let near = distance <= allowed && distance < shortest.max(2) && distance < longest;
            near.then_some((distance, candidate))
        })
        .collect();
    let least = near.iter().map(|(distance, _)| *distance).min();
    let nearest = near
        .into_iter()
        .filter(|(distance, _)| Some(*distance) == least);
    nearest.map(|(_, candidate)| candidate).collect()
}

/// A remedy that names the nearest candidate, or else lists them where they are few.
pub(crate) fn remedy<'c>(
    written: &str,
    candidates: impl IntoIterator<Item = &'c str> + Clone,
    of_all: &str,
) -> Option<String> {
    match all_nearest(written, candidates.clone()).as_slice() {
        [] => {}
        [one] => return Some(format!("`{one}` comes nearest")),
        several => {
            let (last, others) = several[..several.len().min(4)].split_last()?;
            return Some(format!(
                "`{}` and `{last}` come nearest",
                others.join("`, `")
            ));
        }
    }
    let mut few = candidates.into_iter();
    let mut list = String::new();
    for candidate in few.by_ref().take(24) {
        if !list.is_empty() {
            list.push_str(", ");
        }
        list.push('`');
        list.push_str(candidate);
        list.push('`');
    }
    if list.is_empty() {
        return None;
    }
    if few.next().is_some() {
        list.push_str(" …");
    }
    Some(format!("{of_all} {list}"))
}

/// How many letters must be changed, left out, put in or swapped with their neighbour.
fn distance(a: &str, b: &str) -> usize {
    let a: Vec<char> = a.chars().collect();
    let b: Vec<char> = b.chars().collect();
    let mut before: Vec<usize> = Vec::new();
    let mut last: Vec<usize> = (0..=b.len()).collect();
    for (i, &from) in a.iter().enumerate() {
        let mut row = Vec::with_capacity(b.len() + 1);
        row.push(i + 1);
        for (j, &to) in b.iter().enumerate() {
            let mut least = (last[j] + usize::from(from != to))
                .min(last[j + 1] + 1)
                .min(row[j] + 1);
            if i > 0 && j > 0 && from == b[j - 1] && a[i - 1] == to {
                least = least.min(before[j - 1] + 1);
            }
            row.push(least);
        }
        before = std::mem::replace(&mut last, row);
    }
    last.last().copied().unwrap_or(0)
}

#[cfg(test)]
mod tests {
    use super::nearest;

    #[test]
    fn a_slip_of_the_pen_is_understood_and_another_word_is_not() {
        let keys = ["length", "material", "section", "layer"];
        assert_eq!(nearest("lenght", keys), Some("length")); // two letters swapped
        assert_eq!(nearest("Material", keys), Some("material")); // another case
        assert_eq!(nearest("sction", keys), Some("section")); // one left out
        assert_eq!(nearest("colour", keys), None); // another word
        assert_eq!(nearest("", keys), None);
        assert_eq!(nearest("q", ["a", "b"]), None); // no letter left
        assert_eq!(nearest("D", ["a", "d"]), Some("d"));
        assert_eq!(nearest("aa", ["a", "d"]), Some("a"));
    }

    #[test]
    fn those_that_come_equally_near_are_listed_and_else_all() {
        let remedy = |written, names: &[&str]| {
            super::remedy(written, names.iter().copied(), "the points are")
        };
        let said = remedy("p4", &["p1", "p2", "p3", "lug"]);
        assert_eq!(said.as_deref(), Some("`p1`, `p2` and `p3` come nearest"));
        let said = remedy("q", &["a", "b", "c"]);
        assert_eq!(said.as_deref(), Some("the points are `a`, `b`, `c`"));
    }
}
