//! Who gets the water below the dam.
