//! What narrower things have of their own, which takes the place of what is wider.

use super::limits::tables;
use crate::job::written::Entry;
use crate::job::written::limit::Limits;
use crate::job::written::segment::{Kind, Segment};

/// The limits that a segment or a layer has of its own.
#[derive(Debug, Clone, Copy, Default)]
pub(super) struct Own {
    pub(super) tension: bool,
    pub(super) compression: bool,
    pub(super) force: bool,
}

impl Own {
    /// Of a segment, and of a layer of it.
    pub(super) fn of(segment: &Segment<'_>, layer: Option<usize>) -> Self {
        let own = Own::among(&segment.limits);
        let layer = layer.map_or(Own::default(), |layer| Own::of_layer(segment, layer));
        Own {
            tension: own.tension || layer.tension,
            compression: own.compression || layer.compression,
            force: own.force,
        }
    }

    pub(super) fn of_layer(segment: &Segment<'_>, layer: usize) -> Self {
        match &segment.kind {
            Kind::Solid { layers, .. } => layers
                .get(layer)
                .map_or(Own::default(), |layer| Own::among(&layer.limits)),
            _ => Own::default(),
        }
    }

    fn among(limits: &Entry<Vec<Limits<'_>>>) -> Self {
        let any = |is: fn(&Limits<'_>) -> bool| tables(limits).iter().any(is);
        Own {
            tension: any(|limits| limits.tension.is_written()),
            compression: any(|limits| limits.compression.is_written()),
            force: any(|limits| limits.force.is_written()),
        }
    }
}
