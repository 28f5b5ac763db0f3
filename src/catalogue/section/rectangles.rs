//! Second moments of shapes that are made up of rectangles.

use crate::quantity::{Area, Length};

/// A rectangle with its sides along the axes, in metres.
#[derive(Debug, Clone, Copy)]
pub(super) struct Rectangle {
    /// Its size along x and along y.
    pub(super) width: f64,
    pub(super) height: f64,
    /// Its centre.
    pub(super) x: f64,
    pub(super) y: f64,
}

/// The least principal radius of gyration of rectangles that do not overlap, m, on `area`.
///
/// `area` may be more than that of the rectangles: fillets are counted in it and not in the second
/// moment, where they are near the centroid, so that the radius comes out slightly small, on the
/// safe side for buckling. `None` where there is no area.
pub(super) fn least_gyration(rectangles: &[Rectangle], area: Area) -> Option<Length> {
    let areas = rectangles.iter().map(|r| r.width * r.height);
    let sum: f64 = areas.clone().sum();
    if !(sum > 0.0 && area > Area::default()) {
        return None;
    }
    let centre = |along: fn(&Rectangle) -> f64| {
        let moment: f64 = rectangles
            .iter()
            .zip(areas.clone())
            .map(|(r, area)| along(r) * area)
            .sum();
        moment / sum
    };
    let (x0, y0) = (centre(|r| r.x), centre(|r| r.y));
    let (mut about_x, mut about_y, mut product) = (0.0, 0.0, 0.0);
    for (r, area) in rectangles.iter().zip(areas) {
        let (x, y) = (r.x - x0, r.y - y0);
        about_x += area * (r.height * r.height / 12.0 + y * y);
        about_y += area * (r.width * r.width / 12.0 + x * x);
        product += area * x * y;
    }
    let least = if product == 0.0 {
        about_x.min(about_y)
    } else {
        0.5 * (about_x + about_y) - (0.5 * (about_x - about_y)).hypot(product)
    };
    Some(crate::quantity::from_si((least / area.value).sqrt()))
}
