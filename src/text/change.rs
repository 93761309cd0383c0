//! What differs between two versions of a text.

/// The bytes between the longest common beginning and the longest common end of two texts.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub struct Change {
    /// Where they begin.
    pub at: usize,
    /// How many the old text has there.
    pub removed: usize,
    /// How many the new text has there.
    pub added: usize,
}

impl Change {
    /// Compares two texts; `None` where they are equal. Cuts stand between characters of both.
    #[must_use]
    pub fn between(old: &str, new: &str) -> Option<Self> {
        let mut at = common(old.as_bytes(), new.as_bytes());
        if at == old.len() && at == new.len() {
            return None;
        }
        while !old.is_char_boundary(at) || !new.is_char_boundary(at) {
            at -= 1;
        }
        let (old, new) = (&old[at..], &new[at..]);
        let mut behind = common_end(old.as_bytes(), new.as_bytes());
        while !old.is_char_boundary(old.len() - behind) || !new.is_char_boundary(new.len() - behind) {
            behind -= 1;
        }
        Some(Self {
            at,
            removed: old.len() - behind,
            added: new.len() - behind,
        })
    }
}

/// Texts are compared in blocks, which is a comparison of memory, and the last block byte by byte.
const BLOCK: usize = 4096;

fn common(a: &[u8], b: &[u8]) -> usize {
    let blocks = a.chunks_exact(BLOCK).zip(b.chunks_exact(BLOCK));
    let same = BLOCK * blocks.take_while(|(a, b)| a == b).count();
    same + a[same..].iter().zip(&b[same..]).take_while(|(a, b)| a == b).count()
}

fn common_end(a: &[u8], b: &[u8]) -> usize {
    let blocks = a.rchunks_exact(BLOCK).zip(b.rchunks_exact(BLOCK));
    let same = BLOCK * blocks.take_while(|(a, b)| a == b).count();
    let left = a[..a.len() - same].iter().rev().zip(b[..b.len() - same].iter().rev());
    same + left.take_while(|(a, b)| a == b).count()
}

#[cfg(test)]
mod tests {
    use super::*;
    use proptest::prelude::*;

    proptest! {
        #[test]
        fn what_differs_turns_the_old_text_into_the_new(old in "[ab\u{e9}\u{e8}\u{1f600}]{0,9}", new in "[ab\u{e9}\u{e8}\u{1f600}]{0,9}", pad in 0..3_usize) {
            let pad = "x".repeat(pad * 3000);
            let (old, new) = (format!("{pad}{old}{pad}"), format!("{pad}{new}{pad}"));
            let Some(change) = Change::between(&old, &new) else {
                prop_assert_eq!(old, new);
                return Ok(());
            };
            let mut made = old.clone();
            made.replace_range(change.at..change.at + change.removed, &new[change.at..change.at + change.added]);
            prop_assert_eq!(made, new);
            prop_assert!(change.removed > 0 || change.added > 0);
        }
    }
}
