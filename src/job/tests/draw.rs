//! How problems are drawn, where they stand, and what is no text.

use crate::job::{Problem, Source, decode, keys, render};

fn problem(place: std::ops::Range<usize>) -> Problem {
    Problem {
        place,
        message: "what is wrong".to_owned(),
        help: Some("what to write".to_owned()),
        combination: None,
    }
}

#[test]
fn the_place_is_underlined_below_its_line() {
    let source = Source::new("a/b.toml", "x = 1\nlength = \"2.850 m ± 3 kN\"\n");
    let at = source.text.find("kN").unwrap();
    assert_eq!(
        render::draw(&problem(at..at + 2), &source),
        "a/b.toml, line 2, column 23: what is wrong\n\
         \x20   length = \"2.850 m ± 3 kN\"\n\
         \x20                         ~~\n\
         \x20   Instead: what to write\n"
    );
}

#[test]
fn columns_count_characters_and_the_underline_counts_cells() {
    // 東 is one character of two cells and three bytes; a tab stands for up to four blanks.
    let source = Source::new("j", "\t東 = bad");
    let at = source.text.find("bad").unwrap();
    assert_eq!(source.line_and_column(&(at..at + 3)), (1, 6));
    assert_eq!(
        render::draw(&problem(at..at + 3), &source),
        "j, line 1, column 6: what is wrong\n\
         \x20       東 = bad\n\
         \x20            ~~~\n\
         \x20   Instead: what to write\n"
    );
}

#[test]
fn a_long_line_is_cut_around_the_place() {
    let text = format!("{}HERE{}", "a".repeat(500), "b".repeat(500));
    let source = Source::new("j", text);
    let drawn = render::draw(&problem(500..504), &source);
    let lines: Vec<&str> = drawn.lines().collect();
    assert_eq!(
        lines[1],
        format!("    …{}HERE{}…", "a".repeat(24), "b".repeat(48))
    );
    assert_eq!(lines[2], format!("    {}~~~~", " ".repeat(25)));
}

#[test]
fn an_empty_place_is_one_mark_wide_and_an_empty_text_has_none() {
    let source = Source::new("j", "ab\n");
    let drawn = render::draw(&problem(2..2), &source);
    assert_eq!(drawn.lines().nth(2), Some("      ~"));
    let empty = Source::new("j", "");
    assert_eq!(
        render::draw(&problem(0..0), &empty),
        "j, line 1, column 1: what is wrong\n    Instead: what to write\n"
    );
}

#[test]
fn fifty_are_drawn_and_the_rest_is_counted() {
    let source = Source::new("j", "a");
    let many = vec![problem(0..1); 53];
    let drawn = render::draw_all(&many, &source);
    assert_eq!(drawn.matches("what is wrong").count(), 50);
    assert!(drawn.ends_with("\nj: 3 more errors are not shown\n"));
}

#[test]
fn a_byte_order_mark_is_passed_over() {
    assert_eq!(decode(b"\xef\xbb\xbfa = 1").unwrap(), "a = 1");
    assert_eq!(Source::new("j", "\u{feff}a").text, "a");
}

#[test]
fn what_is_no_utf_8_is_refused_with_what_it_looks_like() {
    // "25 °C" as ISO 8859-1 writes it
    let latin = decode(b"a\nt = \"25 \xb0C\"").unwrap_err();
    let source = Source::new("j", latin.text.clone());
    assert_eq!(source.line_and_column(&latin.problem.place), (2, 9));
    assert_eq!(
        latin.problem.message,
        "the byte 0xb0 is not UTF-8; it looks like Latin-1 (ISO 8859-1 or Windows-1252)"
    );
    for utf16 in [&b"\xff\xfea\0"[..], b"\xfe\xff\0a", b"a\0b\0c\0", b"\0a\0b"] {
        let message = decode(utf16).unwrap_err().problem.message;
        assert_eq!(message, "the file is not UTF-8; it looks like UTF-16");
    }
    let nul = decode(b"a = 1\nb\0").unwrap_err().problem;
    assert_eq!(nul.message, "a NUL byte stands in the text");
    assert_eq!(nul.place, 7..8);
    // cut off inside a character
    assert!(decode(b"a \xe2\x82").is_err());
}

#[test]
fn keys_are_listed_once_for_each_table() {
    let keys = keys();
    let segment = keys.iter().find(|(table, _)| *table == "segment").unwrap();
    assert!(segment.1.contains(&"holes"));
    for (table, of_table) in &keys {
        assert_eq!(keys.iter().filter(|(other, _)| other == table).count(), 1);
        for key in *of_table {
            assert_eq!(of_table.iter().filter(|other| *other == key).count(), 1);
        }
    }
}
