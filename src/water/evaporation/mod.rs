//! Reference evaporation.
