//! Patterns for names: `*` stands for anything, `?` for one character.

/// True where `pattern` matches the whole of `text`.
pub(crate) fn matches(pattern: &str, text: &str) -> bool {
    let pattern: Vec<char> = pattern.chars().collect();
    let text: Vec<char> = text.chars().collect();
    let (mut p, mut t) = (0, 0);
    // Where the last star stands, and how much of the text it takes so far.
    let mut star: Option<(usize, usize)> = None;
    while t < text.len() {
        if pattern.get(p) == Some(&'*') {
            star = Some((p, t));
            p += 1;
        } else if pattern.get(p).is_some_and(|&c| c == '?' || c == text[t]) {
            p += 1;
            t += 1;
        } else if let Some((at, taken)) = star {
            star = Some((at, taken + 1));
            p = at + 1;
            t = taken + 1;
        } else {
            return false;
        }
    }
    pattern[p..].iter().all(|&c| c == '*')
}

#[cfg(test)]
mod tests {
    use super::matches;

    #[test]
    fn stars_take_anything_and_question_marks_one() {
        for (pattern, text) in [("R-1*", "R-12"), ("*", ""), ("a*b*c", "axxbyyc"), ("R-?2", "R-12")]
        {
            assert!(matches(pattern, text), "{pattern} {text}");
        }
        for (pattern, text) in [("R-1", "R-12"), ("?", ""), ("a*b", "abc"), ("", "x")] {
            assert!(!matches(pattern, text), "{pattern} {text}");
        }
        assert!(!matches(&"*a".repeat(40), &"a".repeat(39)));
    }
}
