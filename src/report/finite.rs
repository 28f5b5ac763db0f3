//! The last guard before a report: no number that is not finite leaves the program.
//!
//! JSON has no word for such a number, and a writer would put `null` in its place, which means
//! that something does not exist. The guard walks over what would be written and writes nothing.

use serde::ser::{
    self, Impossible, Serialize, SerializeMap, SerializeSeq, SerializeStruct, SerializeTuple,
    Serializer,
};
use std::fmt::Display;

/// A number that is not finite, by the name under which it would be written.
#[derive(Debug, Clone, PartialEq, Eq, thiserror::Error)]
pub enum NotFinite {
    /// The number.
    #[error("`{0}` is not a finite number")]
    Number(&'static str),
    /// What a value says that cannot be written at all.
    #[error("{0}")]
    Unwritable(String),
}

impl ser::Error for NotFinite {
    fn custom<T: Display>(message: T) -> Self {
        NotFinite::Unwritable(message.to_string())
    }
}

/// Whether every number in a value is finite.
///
/// # Errors
/// The name of the first that is not.
pub fn all_finite<T: Serialize>(value: &T) -> Result<(), NotFinite> {
    value.serialize(&mut Guard { name: "number" })
}

/// Walks over a value, remembering the name of the field that it is in.
struct Guard {
    name: &'static str,
}

macro_rules! passed_over {
    ($($method:ident: $type:ty),* $(,)?) => {
        $(fn $method(self, _: $type) -> Result<(), NotFinite> { Ok(()) })*
    };
}

impl Serializer for &mut Guard {
    type Ok = ();
    type Error = NotFinite;
    type SerializeSeq = Self;
    type SerializeTuple = Self;
    type SerializeTupleStruct = Impossible<(), NotFinite>;
    type SerializeTupleVariant = Impossible<(), NotFinite>;
    type SerializeMap = Self;
    type SerializeStruct = Self;
    type SerializeStructVariant = Impossible<(), NotFinite>;

    passed_over! {
        serialize_bool: bool, serialize_char: char, serialize_str: &str, serialize_bytes: &[u8],
        serialize_i8: i8, serialize_i16: i16, serialize_i32: i32, serialize_i64: i64,
        serialize_u8: u8, serialize_u16: u16, serialize_u32: u32, serialize_u64: u64,
        serialize_unit_struct: &'static str,
    }

    fn serialize_f64(self, number: f64) -> Result<(), NotFinite> {
        if number.is_finite() {
            Ok(())
        } else {
            Err(NotFinite::Number(self.name))
        }
    }

    fn serialize_f32(self, number: f32) -> Result<(), NotFinite> {
        self.serialize_f64(number.into())
    }

    fn serialize_none(self) -> Result<(), NotFinite> {
        Ok(())
    }

    fn serialize_unit(self) -> Result<(), NotFinite> {
        Ok(())
    }

    fn serialize_some<T: Serialize + ?Sized>(self, value: &T) -> Result<(), NotFinite> {
        value.serialize(self)
    }

    fn serialize_unit_variant(
        self,
        _: &'static str,
        _: u32,
        _: &'static str,
    ) -> Result<(), NotFinite> {
        Ok(())
    }

    fn serialize_newtype_struct<T: Serialize + ?Sized>(
        self,
        _: &'static str,
        value: &T,
    ) -> Result<(), NotFinite> {
        value.serialize(self)
    }

    fn serialize_newtype_variant<T: Serialize + ?Sized>(
        self,
        _: &'static str,
        _: u32,
        _: &'static str,
        value: &T,
    ) -> Result<(), NotFinite> {
        value.serialize(self)
    }

    fn serialize_seq(self, _: Option<usize>) -> Result<Self, NotFinite> {
        Ok(self)
    }

    fn serialize_map(self, _: Option<usize>) -> Result<Self, NotFinite> {
        Ok(self)
    }

    fn serialize_struct(self, _: &'static str, _: usize) -> Result<Self, NotFinite> {
        Ok(self)
    }

    // A list of known length: a rotation about x, y and z.
    fn serialize_tuple(self, _: usize) -> Result<Self, NotFinite> {
        Ok(self)
    }

    fn serialize_tuple_struct(
        self,
        _: &'static str,
        _: usize,
    ) -> Result<Self::SerializeTupleStruct, NotFinite> {
        Err(ser::Error::custom("results hold no tuples with names"))
    }

    fn serialize_tuple_variant(
        self,
        _: &'static str,
        _: u32,
        _: &'static str,
        _: usize,
    ) -> Result<Self::SerializeTupleVariant, NotFinite> {
        Err(ser::Error::custom("results hold no tuples with names"))
    }

    fn serialize_struct_variant(
        self,
        _: &'static str,
        _: u32,
        _: &'static str,
        _: usize,
    ) -> Result<Self::SerializeStructVariant, NotFinite> {
        Err(ser::Error::custom("results hold no variants with fields"))
    }
}

impl SerializeSeq for &mut Guard {
    type Ok = ();
    type Error = NotFinite;

    fn serialize_element<T: Serialize + ?Sized>(&mut self, value: &T) -> Result<(), NotFinite> {
        value.serialize(&mut **self)
    }

    fn end(self) -> Result<(), NotFinite> {
        Ok(())
    }
}

impl SerializeTuple for &mut Guard {
    type Ok = ();
    type Error = NotFinite;

    fn serialize_element<T: Serialize + ?Sized>(&mut self, value: &T) -> Result<(), NotFinite> {
        value.serialize(&mut **self)
    }

    fn end(self) -> Result<(), NotFinite> {
        Ok(())
    }
}

impl SerializeMap for &mut Guard {
    type Ok = ();
    type Error = NotFinite;

    fn serialize_key<T: Serialize + ?Sized>(&mut self, _: &T) -> Result<(), NotFinite> {
        Ok(())
    }

    fn serialize_value<T: Serialize + ?Sized>(&mut self, value: &T) -> Result<(), NotFinite> {
        value.serialize(&mut **self)
    }

    fn end(self) -> Result<(), NotFinite> {
        Ok(())
    }
}

impl SerializeStruct for &mut Guard {
    type Ok = ();
    type Error = NotFinite;

    fn serialize_field<T: Serialize + ?Sized>(
        &mut self,
        name: &'static str,
        value: &T,
    ) -> Result<(), NotFinite> {
        self.name = name;
        value.serialize(&mut **self)
    }

    fn end(self) -> Result<(), NotFinite> {
        Ok(())
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::quantity::from_si;
    use crate::report::sample;
    use crate::result::Rotation;

    #[test]
    fn a_finished_result_passes() {
        assert_eq!(all_finite(&sample::failing()), Ok(()));
        assert_eq!(all_finite(&sample::assembly::plane()), Ok(()));
        assert_eq!(all_finite(&sample::assembly::space()), Ok(()));
    }

    #[test]
    fn a_number_that_is_not_finite_is_named_wherever_it_hides() {
        let mut plain = sample::failing();
        plain.combinations[0].members[0].force_max = from_si(f64::INFINITY);
        assert_eq!(all_finite(&plain), Err(NotFinite::Number("force_max")));

        let mut optional = sample::failing();
        optional.combinations[0].members[1].supports[1].gap = Some(from_si(f64::NAN));
        assert_eq!(all_finite(&optional), Err(NotFinite::Number("gap")));

        let mut factor = sample::failing();
        factor.combinations[0]
            .factors
            .insert("dead".into(), f64::NAN);
        assert_eq!(all_finite(&factor), Err(NotFinite::Number("factors")));

        let mut turned = sample::assembly::space();
        let nowhere = [0.0, 0.0, f64::NAN].map(from_si);
        turned.combinations[0].bodies[0].rotation = Rotation::Spatial(nowhere);
        assert_eq!(all_finite(&turned), Err(NotFinite::Number("rotation")));

        let mut watched = sample::assembly::plane();
        watched.combinations[0].watches[0].value = Some(f64::INFINITY);
        assert_eq!(all_finite(&watched), Err(NotFinite::Number("value")));
    }
}
