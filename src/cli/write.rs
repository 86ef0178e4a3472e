//! Writing a file so that a crash leaves the old one whole: a temporary file beside it, then a
//! rename.

use super::refusal::{Refusal, reason};
use std::io::Write;
use std::path::Path;

/// Puts `bytes` into the file at `path`, which keeps its permissions if it is there already.
///
/// What is no regular file (a device, a pipe) is written to directly; a link is followed.
///
/// # Errors
/// When the file cannot be written; it is then as it was.
pub(crate) fn atomically(path: &Path, bytes: &[u8]) -> Result<(), Refusal> {
    whole(path, bytes).map_err(|error| {
        let help = match error.kind() {
            std::io::ErrorKind::PermissionDenied => {
                "allow writing to it and to its folder, or name another file"
            }
            _ => "name a file in a folder that exists and can be written to",
        };
        Refusal::new(format!("cannot write `{}`: {}", path.display(), reason(&error)), help)
    })
}

fn whole(path: &Path, bytes: &[u8]) -> std::io::Result<()> {
    let target = path.canonicalize().unwrap_or_else(|_| path.to_path_buf());
    let there = std::fs::metadata(&target).ok();
    if there.as_ref().is_some_and(|m| !m.is_file()) {
        return std::fs::write(&target, bytes);
    }
    // A rename would put a new file in the place of one that is protected from writing.
    if there.as_ref().is_some_and(|m| m.permissions().readonly()) {
        return Err(std::io::ErrorKind::PermissionDenied.into());
    }
    let folder = match target.parent() {
        Some(folder) if !folder.as_os_str().is_empty() => folder,
        _ => Path::new("."),
    };
    let mut builder = tempfile::Builder::new();
    builder.prefix(".gapkeep-");
    #[cfg(unix)]
    {
        use std::os::unix::fs::PermissionsExt;
        // As any new file: what the user's mask leaves of reading and writing for all.
        builder.permissions(std::fs::Permissions::from_mode(0o666));
    }
    let mut file = builder.tempfile_in(folder)?;
    file.write_all(bytes)?;
    if let Some(there) = there {
        file.as_file().set_permissions(there.permissions())?;
    }
    file.as_file().sync_all()?;
    file.persist(&target).map_err(|error| error.error)?;
    Ok(())
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_file_is_replaced_whole_and_nothing_is_left_beside_it() {
        let folder = tempfile::tempdir().unwrap();
        let path = folder.path().join("report.json");
        atomically(&path, b"one").unwrap();
        atomically(&path, b"two").unwrap();
        assert_eq!(std::fs::read(&path).unwrap(), b"two");
        assert_eq!(std::fs::read_dir(folder.path()).unwrap().count(), 1);
    }

    #[test]
    fn a_folder_that_is_not_there_is_said() {
        let folder = tempfile::tempdir().unwrap();
        let refusal = atomically(&folder.path().join("no/report.json"), b"x").unwrap_err();
        assert!(refusal.message.contains("there is no such file"), "{}", refusal.message);
        assert!(refusal.help.is_some());
    }

    #[test]
    fn a_protected_file_is_left_alone() {
        let folder = tempfile::tempdir().unwrap();
        let path = folder.path().join("spindle.gap");
        std::fs::write(&path, b"old").unwrap();
        let writable = std::fs::metadata(&path).unwrap().permissions();
        let mut protected = writable.clone();
        protected.set_readonly(true);
        std::fs::set_permissions(&path, protected).unwrap();
        let refusal = atomically(&path, b"new").unwrap_err();
        assert!(refusal.message.ends_with("its permissions forbid it"), "{}", refusal.message);
        assert!(refusal.help.is_some_and(|help| help.starts_with("allow writing")));
        assert_eq!(std::fs::read(&path).unwrap(), b"old");
        assert_eq!(std::fs::read_dir(folder.path()).unwrap().count(), 1);
        std::fs::set_permissions(&path, writable).unwrap();
    }

    #[cfg(unix)]
    #[test]
    fn a_link_is_followed_and_permissions_stay() {
        use std::os::unix::fs::{PermissionsExt, symlink};
        let folder = tempfile::tempdir().unwrap();
        let real = folder.path().join("real");
        std::fs::write(&real, b"old").unwrap();
        std::fs::set_permissions(&real, std::fs::Permissions::from_mode(0o640)).unwrap();
        let link = folder.path().join("link");
        symlink(&real, &link).unwrap();
        atomically(&link, b"new").unwrap();
        assert_eq!(std::fs::read(&real).unwrap(), b"new");
        assert!(std::fs::symlink_metadata(&link).unwrap().is_symlink());
        assert_eq!(std::fs::metadata(&real).unwrap().permissions().mode() & 0o777, 0o640);
    }
}
