//! Which files a call names, and reading them: never outside the root of the run, never more than a
//! spec or a table can sensibly hold.

use super::refusal::{Refusal, reason};
use crate::resolve::{FileError, Files};
use std::io::Read;
use std::path::{Component, Path, PathBuf};

/// Longest file that is read, bytes.
pub(crate) const MOST_BYTES: u64 = 16 << 20;

/// The ending of a spec's file name.
const ENDING: &str = "gap";

/// A spec to be checked.
#[derive(Debug, Clone, PartialEq, Eq)]
pub(crate) struct Place {
    /// The folder that nothing is read outside of; no link in it.
    pub(crate) root: PathBuf,
    /// The file, from the root, `/` between folders; `None` for standard input.
    pub(crate) name: Option<String>,
}

impl Place {
    /// The name shown to people.
    pub(crate) fn shown(&self) -> &str {
        self.name.as_deref().unwrap_or("<stdin>")
    }

    /// The file itself.
    pub(crate) fn path(&self) -> Option<PathBuf> {
        self.name.as_ref().map(|name| self.root.join(name))
    }
}

/// The files below a root.
#[derive(Debug, Clone)]
pub(crate) struct Rooted {
    /// The root, without links.
    pub(crate) root: PathBuf,
}

impl Files for Rooted {
    fn read(&self, path: &str) -> Result<Vec<u8>, FileError> {
        let plain = Path::new(path).components().all(|c| matches!(c, Component::Normal(_)));
        if !plain {
            return Err(FileError::Outside);
        }
        let file = self.root.join(path).canonicalize().map_err(|error| match error.kind() {
            std::io::ErrorKind::NotFound | std::io::ErrorKind::NotADirectory => FileError::Missing,
            _ => FileError::Unreadable(reason(&error)),
        })?;
        // A link may lead anywhere; what counts is where it ends.
        if !file.starts_with(&self.root) {
            return Err(FileError::Outside);
        }
        read(&file).map_err(FileError::Unreadable)
    }
}

impl Rooted {
    /// The bytes of a file named on the command line.
    ///
    /// # Errors
    /// When it cannot be read, in words and with a way out.
    pub(crate) fn bytes(&self, name: &str) -> Result<Vec<u8>, Refusal> {
        self.read(name).map_err(|error| {
            let why = match error {
                FileError::Missing => "there is no such file".to_string(),
                FileError::Outside => "it lies outside the root of the run".to_string(),
                FileError::Unreadable(why) => why,
            };
            Refusal::new(
                format!("cannot read `{name}`: {why}"),
                "name a `.gap` file, a folder, or `-` for standard input",
            )
        })
    }
}

/// The bytes of a file that is one and is not too long.
fn read(path: &Path) -> Result<Vec<u8>, String> {
    let file = std::fs::File::open(path).map_err(|error| reason(&error))?;
    let about = file.metadata().map_err(|error| reason(&error))?;
    if about.is_dir() {
        return Err("it is a folder".to_string());
    }
    let mut bytes = Vec::new();
    file.take(MOST_BYTES + 1).read_to_end(&mut bytes).map_err(|error| reason(&error))?;
    if bytes.len() as u64 > MOST_BYTES {
        return Err(format!("it is longer than {} MiB", MOST_BYTES >> 20));
    }
    Ok(bytes)
}

/// The specs that a call names, in its order, those of a folder in the order of their names, each
/// once; and what is wrong with the rest.
///
/// In a folder only files with an `assembly` line count: the others are parts of them. Hidden
/// folders and links to folders are passed by.
pub(crate) fn specs(
    paths: &[PathBuf],
    root: Option<&Path>,
    folder: &Path,
) -> (Vec<Place>, Vec<Refusal>) {
    each(paths, |path| below(path, root, folder, is_assembly))
}

/// As [`specs`], with the files of a folder that are parts of assemblies.
pub(crate) fn all_files(paths: &[PathBuf], folder: &Path) -> (Vec<Place>, Vec<Refusal>) {
    each(paths, |path| below(path, None, folder, |_| true))
}

fn each(
    paths: &[PathBuf],
    below: impl Fn(&Path) -> Result<Vec<Place>, Refusal>,
) -> (Vec<Place>, Vec<Refusal>) {
    let mut found: Vec<Place> = Vec::new();
    let mut wrong = Vec::new();
    for path in paths {
        match below(path) {
            Ok(places) => {
                for place in places {
                    if !found.contains(&place) {
                        found.push(place);
                    }
                }
            }
            Err(refusal) => wrong.push(refusal),
        }
    }
    (found, wrong)
}

/// The file at a path, or those below it that `counts` lets pass.
fn below(
    path: &Path,
    root: Option<&Path>,
    folder: &Path,
    counts: fn(&Path) -> bool,
) -> Result<Vec<Place>, Refusal> {
    let canonical = |path: &Path| {
        folder.join(path).canonicalize().map_err(|error| {
            Refusal::new(
                format!("cannot read `{}`: {}", path.display(), reason(&error)),
                "name a `.gap` file, a folder, or `-` for standard input",
            )
        })
    };
    let here = match root {
        Some(root) => canonical(root)?,
        None => canonical(Path::new("."))?,
    };
    if path == Path::new("-") {
        return Ok(vec![Place { root: here, name: None }]);
    }
    let file = canonical(path)?;
    let is_folder = file.is_dir();
    let root = if file.starts_with(&here) {
        here
    } else if root.is_some() {
        return Err(Refusal::new(
            format!("`{}` lies outside the root of the run", path.display()),
            "name a root above it with `--root`",
        ));
    } else if is_folder {
        file.clone()
    } else {
        file.parent().map_or_else(|| here.clone(), Path::to_path_buf)
    };
    if !is_folder {
        return Ok(vec![place(&root, &file)?]);
    }
    let mut files = Vec::new();
    walk(&file, &mut files)?;
    let mut places = Vec::new();
    for file in files {
        if counts(&file) {
            places.push(place(&root, &file)?);
        }
    }
    if places.is_empty() {
        return Err(Refusal::new(
            format!("`{}` holds no `.gap` file with an `assembly` line", path.display()),
            "name a folder of specs, or a spec itself",
        ));
    }
    Ok(places)
}

/// Names a file from the root.
fn place(root: &Path, file: &Path) -> Result<Place, Refusal> {
    let below = file.strip_prefix(root).unwrap_or(file);
    let steps: Option<Vec<&str>> = below.iter().map(|step| step.to_str()).collect();
    match steps {
        Some(steps) => Ok(Place { root: root.to_path_buf(), name: Some(steps.join("/")) }),
        None => Err(Refusal::new(
            format!("the name of `{}` is not UTF-8", file.display()),
            "rename it; reports name files in text",
        )),
    }
}

/// All spec files below a folder, in the order of their names.
fn walk(folder: &Path, files: &mut Vec<PathBuf>) -> Result<(), Refusal> {
    let refuse = |error: &std::io::Error| {
        Refusal::new(
            format!("cannot read the folder `{}`: {}", folder.display(), reason(error)),
            "allow reading it, or name the specs one by one",
        )
    };
    let entries: Result<Vec<std::fs::DirEntry>, _> =
        std::fs::read_dir(folder).map_err(|e| refuse(&e))?.collect();
    let mut entries = entries.map_err(|e| refuse(&e))?;
    entries.sort_by_key(std::fs::DirEntry::file_name);
    for entry in entries {
        let path = entry.path();
        let kind = entry.file_type().map_err(|e| refuse(&e))?;
        let hidden = entry.file_name().to_string_lossy().starts_with('.');
        if kind.is_dir() && !hidden {
            walk(&path, files)?;
        } else if path.extension().is_some_and(|e| e == ENDING) && path.is_file() {
            files.push(path);
        }
    }
    Ok(())
}

/// True where some line begins with the word `assembly`. What cannot be read counts, so that it is
/// reported and not passed by.
fn is_assembly(path: &Path) -> bool {
    let Ok(bytes) = read(path) else { return true };
    let text = String::from_utf8_lossy(&bytes);
    text.trim_start_matches('\u{feff}').lines().any(|line| {
        let rest = line.trim_start().strip_prefix("assembly");
        rest.is_some_and(|r| r.is_empty() || r.starts_with([' ', '\t', '"', '\u{a0}']))
    })
}

#[cfg(test)]
mod tests {
    use super::*;

    fn folder() -> (tempfile::TempDir, PathBuf) {
        let folder = tempfile::tempdir().unwrap();
        let root = folder.path().canonicalize().unwrap();
        std::fs::create_dir_all(root.join("specs/.hidden")).unwrap();
        for (name, text) in [
            ("specs/b.gap", "assembly \"b\"\n"),
            ("specs/a.gap", "  assembly \"a\"\n"),
            ("specs/parts.gap", "part x of steel {}\n"),
            ("specs/.hidden/c.gap", "assembly \"c\"\n"),
            ("outside.csv", "x"),
        ] {
            std::fs::write(root.join(name), text).unwrap();
        }
        (folder, root)
    }

    #[test]
    fn a_folder_gives_its_assemblies_in_the_order_of_their_names() {
        let (_keep, root) = folder();
        let paths = [PathBuf::from("specs"), PathBuf::from("specs/a.gap")];
        let (found, wrong) = specs(&paths, None, &root);
        assert_eq!(wrong, []);
        let names: Vec<&str> = found.iter().map(Place::shown).collect();
        assert_eq!(names, ["specs/a.gap", "specs/b.gap"]);
    }

    #[test]
    fn what_is_not_there_or_not_allowed_is_said_with_a_way_out() {
        let (_keep, root) = folder();
        std::fs::create_dir(root.join("empty")).unwrap();
        for (path, root_folder) in
            [("no.gap", None), ("empty", None), ("outside.csv", Some("specs"))]
        {
            let (found, wrong) = specs(&[PathBuf::from(path)], root_folder.map(Path::new), &root);
            assert_eq!(found, []);
            assert!(wrong[0].help.is_some() && !wrong[0].message.contains("os error"), "{wrong:?}");
        }
    }

    #[cfg(unix)]
    #[test]
    fn nothing_outside_the_root_is_read_by_any_way() {
        let (_keep, root) = folder();
        std::os::unix::fs::symlink(root.join("outside.csv"), root.join("specs/link.csv")).unwrap();
        let files = Rooted { root: root.join("specs") };
        assert!(files.read("a.gap").is_ok());
        for path in ["../outside.csv", "link.csv", "/etc/hostname", "./a.gap/../../outside.csv"] {
            assert_eq!(files.read(path), Err(FileError::Outside), "{path}");
        }
        assert_eq!(files.read("no.csv"), Err(FileError::Missing));
        assert_eq!(files.read(".hidden"), Err(FileError::Unreadable("it is a folder".into())));
    }
}
