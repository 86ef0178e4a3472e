//! How a rendering for people may look: colour or not, drawing characters or plain ASCII, how wide.
//!
//! Colour repeats what a word or a mark already says, never more. Must not know where the text goes.

use owo_colors::{OwoColorize, Style};

/// What the reader's side can show.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub struct Look {
    /// True where colour codes may be written.
    pub colour: bool,
    /// True where drawing characters beyond ASCII may be written.
    pub drawing: bool,
    /// Columns of a line.
    pub width: usize,
}

/// What a piece of text is, from which its colour follows.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Role {
    /// A title or a name that begins a block.
    Title,
    /// Something holds.
    Good,
    /// Something fails.
    Bad,
    /// Something needs a look.
    Warn,
    /// Something said in passing.
    Quiet,
    /// What would mend it.
    Cure,
    /// Nothing special.
    Plain,
}

impl Look {
    /// ASCII without colour at 80 columns: what files and pipes get.
    pub const PLAIN: Look = Look { colour: false, drawing: false, width: 80 };

    /// The text in the colour of its role, or as it is.
    pub fn paint(self, role: Role, text: &str) -> String {
        if !self.colour || text.is_empty() || role == Role::Plain {
            return text.to_string();
        }
        text.style(style(role)).to_string()
    }

    /// The first where drawing characters may be written, else the second.
    pub fn pick<T>(self, drawing: T, plain: T) -> T {
        if self.drawing { drawing } else { plain }
    }
}

/// The colour of a role. The sixteen colours of the terminal's own palette only, which readers
/// adjust to their eyes.
pub(super) fn style(role: Role) -> Style {
    match role {
        Role::Title => Style::new().bold(),
        Role::Good => Style::new().green(),
        Role::Bad => Style::new().red().bold(),
        Role::Warn => Style::new().yellow(),
        Role::Quiet => Style::new().dimmed(),
        Role::Cure => Style::new().cyan(),
        Role::Plain => Style::new(),
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn plain_text_stays_as_it_is() {
        assert_eq!(Look::PLAIN.paint(Role::Bad, "fails"), "fails");
        let colour = Look { colour: true, ..Look::PLAIN };
        assert_eq!(colour.paint(Role::Plain, "x"), "x");
        assert_eq!(colour.paint(Role::Good, "holds"), "\u{1b}[32mholds\u{1b}[0m");
    }
}
