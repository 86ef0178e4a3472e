//! Reading a value and converting it in one step, so that a mistake is reported where it stands.
//!
//! The reader puts the place of a value to an error that arises while that value is being visited,
//! not to one that arises afterwards; so the conversion must happen inside the visit.

use serde::de::value::MapAccessDeserializer;
use serde::de::{Deserialize, Deserializer, Error, MapAccess, Visitor};
use std::fmt;
use std::marker::PhantomData;

/// Reads a block of fields and converts it.
pub(super) fn block<'de, D, B, T>(
    deserializer: D,
    expected: &str,
    convert: impl FnOnce(B) -> Result<T, String>,
) -> Result<T, D::Error>
where
    D: Deserializer<'de>,
    B: Deserialize<'de>,
{
    struct Reader<'a, B, F>(&'a str, F, PhantomData<B>);
    impl<'de, B, T, F> Visitor<'de> for Reader<'_, B, F>
    where
        B: Deserialize<'de>,
        F: FnOnce(B) -> Result<T, String>,
    {
        type Value = T;
        fn expecting(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
            f.write_str(self.0)
        }
        fn visit_map<A: MapAccess<'de>>(self, map: A) -> Result<T, A::Error> {
            let block = B::deserialize(MapAccessDeserializer::new(map))?;
            (self.1)(block).map_err(A::Error::custom)
        }
    }
    deserializer.deserialize_map(Reader(expected, convert, PhantomData))
}

/// Reads a text, or a number as its text, and converts it.
pub(super) fn text<'de, D: Deserializer<'de>, T>(
    deserializer: D,
    expected: &str,
    convert: impl FnOnce(&str) -> Result<T, String>,
) -> Result<T, D::Error> {
    struct Reader<'a, F>(&'a str, F);
    impl<'de, T, F: FnOnce(&str) -> Result<T, String>> Visitor<'de> for Reader<'_, F> {
        type Value = T;
        fn expecting(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
            f.write_str(self.0)
        }
        fn visit_str<E: Error>(self, text: &str) -> Result<T, E> {
            (self.1)(text).map_err(E::custom)
        }
        fn visit_f64<E: Error>(self, number: f64) -> Result<T, E> {
            self.visit_str(&number.to_string())
        }
        fn visit_i64<E: Error>(self, number: i64) -> Result<T, E> {
            self.visit_str(&number.to_string())
        }
        fn visit_u64<E: Error>(self, number: u64) -> Result<T, E> {
            self.visit_str(&number.to_string())
        }
    }
    deserializer.deserialize_any(Reader(expected, convert))
}
