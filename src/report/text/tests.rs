//! The text report of results made by hand.

use super::*;
use crate::report::sample;

const PAGE: Layout = Layout {
    width: 80,
    colour: false,
    digits: 4,
};

fn whole(job: &JobResult, layout: &Layout) -> String {
    let mut out = Vec::new();
    write_job(&mut out, job, layout).unwrap();
    String::from_utf8(out).unwrap()
}

#[test]
fn show() {
    println!("{}", whole(&sample::failing(), &PAGE));
    println!("{}", whole(&sample::failing(), &Layout{width: 200, ..PAGE}));
    println!("{}", whole(&sample::unreadable(), &PAGE));
}
