//! From a file's bytes to text. YAML 1.2 section 5.2 allows UTF-8, UTF-16 and UTF-32 with a byte order mark.

use std::fmt;

/// Why bytes are no text.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct DecodeError {
    /// The encoding that the bytes begin like.
    pub encoding: &'static str,
    /// Offset of the first byte that does not fit.
    pub offset: usize,
}

impl fmt::Display for DecodeError {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        write!(
            f,
            "byte {} is not {}; save the file as UTF-8",
            self.offset, self.encoding
        )
    }
}

impl std::error::Error for DecodeError {}

/// Decodes a file. The byte order mark is not part of the text, so that columns count from the first real character.
///
/// # Errors
/// The first byte that does not fit the encoding.
pub fn decode(bytes: Vec<u8>) -> Result<String, DecodeError> {
    match bytes.as_slice() {
        [0xFF, 0xFE, 0, 0, rest @ ..] => utf32(rest, 4, u32::from_le_bytes, "UTF-32 (little endian)"),
        [0, 0, 0xFE, 0xFF, rest @ ..] => utf32(rest, 4, u32::from_be_bytes, "UTF-32 (big endian)"),
        [0xFF, 0xFE, rest @ ..] => utf16(rest, 2, u16::from_le_bytes, "UTF-16 (little endian)"),
        [0xFE, 0xFF, rest @ ..] => utf16(rest, 2, u16::from_be_bytes, "UTF-16 (big endian)"),
        // Without a mark, a first character below U+0100 tells the encoding by its zero bytes.
        [0, first, ..] if *first != 0 => utf16(&bytes, 0, u16::from_be_bytes, "UTF-16 (big endian)"),
        [first, 0, ..] if *first != 0 && bytes.len().is_multiple_of(2) && bytes.get(3) == Some(&0) => {
            utf16(&bytes, 0, u16::from_le_bytes, "UTF-16 (little endian)")
        }
        _ => {
            let mark = bytes.starts_with(&[0xEF, 0xBB, 0xBF]);
            let mut text = String::from_utf8(bytes).map_err(|error| DecodeError {
                encoding: "UTF-8",
                offset: error.utf8_error().valid_up_to(),
            })?;
            if mark {
                text.drain(..3);
            }
            Ok(text)
        }
    }
}

/// Decodes bytes that stand behind a byte order mark of `mark` bytes.
fn utf16(bytes: &[u8], mark: usize, unit: fn([u8; 2]) -> u16, encoding: &'static str) -> Result<String, DecodeError> {
    let pairs = bytes.as_chunks::<2>();
    let mut text = String::with_capacity(bytes.len());
    let mut units = 0;
    for decoded in char::decode_utf16(pairs.0.iter().map(|pair| unit(*pair))) {
        let offset = mark + 2 * units;
        let character = decoded.map_err(|_| DecodeError { encoding, offset })?;
        units += character.len_utf16();
        text.push(character);
    }
    if pairs.1.is_empty() {
        Ok(text)
    } else {
        let offset = mark + bytes.len() - 1;
        Err(DecodeError { encoding, offset })
    }
}

fn utf32(bytes: &[u8], mark: usize, unit: fn([u8; 4]) -> u32, encoding: &'static str) -> Result<String, DecodeError> {
    let words = bytes.as_chunks::<4>();
    let mut text = String::with_capacity(bytes.len());
    for (at, word) in words.0.iter().enumerate() {
        let offset = mark + 4 * at;
        text.push(char::from_u32(unit(*word)).ok_or(DecodeError { encoding, offset })?);
    }
    if words.1.is_empty() {
        Ok(text)
    } else {
        let offset = mark + 4 * words.0.len();
        Err(DecodeError { encoding, offset })
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn reads_the_encodings_that_yaml_allows() {
        let text = "mark: B1 # déjà 梁";
        let utf16 = |mark: bool, bytes: fn(u16) -> [u8; 2]| {
            let mark = mark.then_some(0xFEFF_u16);
            mark.into_iter()
                .chain(text.encode_utf16())
                .flat_map(bytes)
                .collect::<Vec<u8>>()
        };
        let utf32: Vec<u8> = std::iter::once('\u{FEFF}')
            .chain(text.chars())
            .flat_map(|c| (c as u32).to_be_bytes())
            .collect();
        let cases = [
            text.as_bytes().to_vec(),
            [b"\xEF\xBB\xBF", text.as_bytes()].concat(),
            utf16(true, u16::to_le_bytes),
            utf16(true, u16::to_be_bytes),
            utf16(false, u16::to_le_bytes),
            utf16(false, u16::to_be_bytes),
            utf32,
        ];
        for bytes in cases {
            assert_eq!(decode(bytes.clone()).as_deref(), Ok(text), "{bytes:?}");
        }
        assert_eq!(decode(Vec::new()).as_deref(), Ok(""));
    }

    #[test]
    fn names_the_byte_that_is_no_text() {
        let error = decode(b"mark: B\xE9ton".to_vec()).unwrap_err();
        assert_eq!(error.to_string(), "byte 7 is not UTF-8; save the file as UTF-8");
        // Offsets count the mark, and two units for a character beyond U+FFFF.
        let mut bytes: Vec<u8> = "\u{FEFF}😀".encode_utf16().flat_map(u16::to_le_bytes).collect();
        bytes.extend([0x00, 0xD8]);
        assert_eq!(decode(bytes.clone()).unwrap_err().offset, 6);
        bytes.truncate(7);
        assert_eq!(decode(bytes).unwrap_err().offset, 6);
    }
}
