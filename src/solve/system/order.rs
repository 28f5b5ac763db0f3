//! The order in which unknowns are eliminated: nested dissection by where they lie.

/// So many places are ordered as they stand.
const LEAF: usize = 32;

/// Rows over unknowns, one after another.
pub(super) trait Rows {
    /// How many.
    fn count(&self) -> usize;
    /// One of them, by rising unknown.
    fn row(&self, index: usize) -> &[(usize, f64)];
}

/// The unknowns in the order of their elimination. Places are cut in two across their longest side;
/// what lies between the halves goes last, so that neither fills the other. Unknowns of one place
/// stay together.
pub(super) fn order(places: &[[f64; 3]], rows: &impl Rows) -> Vec<usize> {
    let (of_unknown, nodes) = nodes(places);
    let mut dissection = Dissection::new(places, rows, &of_unknown, &nodes);
    let mut all: Vec<usize> = (0..nodes.len()).collect();
    let mut ordered = Vec::with_capacity(nodes.len());
    dissection.cut(&mut all, &mut ordered);
    let unknowns = ordered.into_iter().flat_map(|node| &nodes[node]);
    unknowns.copied().collect()
}

/// Unknowns that share a place: the node of each, and the unknowns of each node.
fn nodes(places: &[[f64; 3]]) -> (Vec<usize>, Vec<Vec<usize>>) {
    let mut sorted: Vec<usize> = (0..places.len()).collect();
    let compare = |a: &usize, b: &usize| {
        let by_side = |side: usize| places[*a][side].total_cmp(&places[*b][side]);
        by_side(0).then(by_side(1)).then(by_side(2)).then(a.cmp(b))
    };
    sorted.sort_unstable_by(compare);
    let mut of_unknown = vec![0; places.len()];
    let mut nodes: Vec<Vec<usize>> = Vec::new();
    for same in sorted.chunk_by(|&a, &b| places[a] == places[b]) {
        for &unknown in same {
            of_unknown[unknown] = nodes.len();
        }
        nodes.push(same.to_vec());
    }
    (of_unknown, nodes)
}

struct Dissection {
    places: Vec<[f64; 3]>,
    /// The rows that each node is in, and where each node's list starts.
    rows_of: Vec<usize>,
    starts: Vec<usize>,
    /// By row: the last half whose nodes are in it.
    seen: Vec<usize>,
    halves: usize,
}

impl Dissection {
    fn new(
        places: &[[f64; 3]],
        rows: &impl Rows,
        of_unknown: &[usize],
        nodes: &[Vec<usize>],
    ) -> Self {
        let mut starts = vec![0; nodes.len() + 1];
        let each = |visit: &mut dyn FnMut(usize, usize)| {
            for row in 0..rows.count() {
                let mut last = usize::MAX;
                for &(unknown, _) in rows.row(row) {
                    // Unknowns of one node mostly stand side by side: most repeats are left out.
                    if of_unknown[unknown] != last {
                        last = of_unknown[unknown];
                        visit(last, row);
                    }
                }
            }
        };
        each(&mut |node, _| starts[node + 1] += 1);
        for node in 0..nodes.len() {
            starts[node + 1] += starts[node];
        }
        let mut next = starts.clone();
        let mut rows_of = vec![0; starts[nodes.len()]];
        each(&mut |node, row| {
            rows_of[next[node]] = row;
            next[node] += 1;
        });
        Dissection {
            places: nodes.iter().map(|node| places[node[0]]).collect(),
            rows_of,
            starts,
            seen: vec![0; rows.count()],
            halves: 0,
        }
    }

    fn rows(&self, node: usize) -> std::ops::Range<usize> {
        self.starts[node]..self.starts[node + 1]
    }

    /// Puts the nodes into order behind those that are ordered already.
    fn cut(&mut self, nodes: &mut [usize], ordered: &mut Vec<usize>) {
        if nodes.len() <= LEAF {
            ordered.extend_from_slice(nodes);
            return;
        }
        let side = self.longest_side(nodes);
        let middle = nodes.len() / 2;
        let places = &self.places;
        nodes.select_nth_unstable_by(middle, |&a, &b| {
            places[a][side].total_cmp(&places[b][side]).then(a.cmp(&b))
        });
        let (left, right) = nodes.split_at_mut(middle);
        let left_touches = self.touching(left, right);
        let right_touches = self.touching(right, left);
        let between = if left_touches <= right_touches {
            self.cut(&mut left[left_touches..], ordered);
            self.cut(right, ordered);
            &left[..left_touches]
        } else {
            self.cut(left, ordered);
            self.cut(&mut right[right_touches..], ordered);
            &right[..right_touches]
        };
        ordered.extend_from_slice(between);
    }

    fn longest_side(&self, nodes: &[usize]) -> usize {
        let length = |side: usize| {
            let along = || nodes.iter().map(|&node| self.places[node][side]);
            along().fold(f64::NEG_INFINITY, f64::max) - along().fold(f64::INFINITY, f64::min)
        };
        (1..3).fold(0, |longest, side| {
            if length(side) > length(longest) {
                side
            } else {
                longest
            }
        })
    }

    /// Moves the nodes that share a row with `others` to the front, both groups by rising node;
    /// gives their number.
    fn touching(&mut self, nodes: &mut [usize], others: &[usize]) -> usize {
        self.halves += 1;
        for &other in others {
            for at in self.rows(other) {
                self.seen[self.rows_of[at]] = self.halves;
            }
        }
        let touches = |node: usize| {
            let rows = &self.rows_of[self.rows(node)];
            rows.iter().any(|&row| self.seen[row] == self.halves)
        };
        nodes.sort_by_cached_key(|&node| (!touches(node), node));
        nodes.partition_point(|&node| touches(node))
    }
}
