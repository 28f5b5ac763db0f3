//! Reading whole jobs. Expected values are worked by hand from the job's own numbers.

mod bad;
mod draw;
mod fuzz;
mod good;

/// A job with one fixed member of one round segment, and lines added to it.
fn tie(more: &str) -> String {
    format!(
        "[member.tie]\nstart = \"fixed\"\nsegment = [{{ name = \"rod\", length = \"2 m\", section = \
         {{ round = \"20 mm\" }}, material = \"steel-s355\" }}]\n{more}\n"
    )
}
