//! Bytes to text. Knows UTF-8 and nothing of the language.

/// Why bytes are no text, and where.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub struct NotText {
    /// Offset of the first offending byte; all before it is text.
    pub offset: usize,
    /// Line of that byte, from 1.
    pub line: usize,
    /// What is wrong there, in words.
    pub reason: &'static str,
}

/// Reads `bytes` as UTF-8 without NUL.
///
/// # Errors
/// The first byte that is no text.
pub fn decode(bytes: &[u8]) -> Result<&str, NotText> {
    let fail = |offset: usize, reason| NotText {
        offset,
        line: 1 + bytes[..offset].iter().filter(|byte| **byte == b'\n').count(),
        reason,
    };
    if bytes.starts_with(&[0xFF, 0xFE]) || bytes.starts_with(&[0xFE, 0xFF]) {
        return Err(fail(0, "the file is UTF-16; save it as UTF-8"));
    }
    let nul = bytes.iter().position(|byte| *byte == 0);
    match std::str::from_utf8(bytes) {
        Err(error) if nul.is_none_or(|at| error.valid_up_to() < at) => {
            Err(fail(error.valid_up_to(), "a byte that is not UTF-8"))
        }
        Err(_) => Err(fail(nul.unwrap_or(0), "a NUL byte")),
        Ok(text) => nul.map_or(Ok(text), |at| Err(fail(at, "a NUL byte"))),
    }
}

#[cfg(test)]
mod tests {
    use super::decode;

    #[test]
    fn points_at_the_first_byte_that_is_no_text() {
        assert_eq!(decode("Ø 12\n".as_bytes()), Ok("Ø 12\n"));
        let places = [
            (&b"a\nb\xFF"[..], 3, 2),
            (&b"a\0\xFF"[..], 1, 1),
            (&b"a\n\n\0"[..], 3, 3),
            (&b"\xFF\xFEa\0"[..], 0, 1),
        ];
        for (bytes, offset, line) in places {
            let error = decode(bytes).expect_err("no text");
            assert_eq!((error.offset, error.line), (offset, line), "{bytes:?}");
        }
    }
}
