//! Languages, numbers, units and dates: every word that a person can see.
