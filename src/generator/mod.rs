//! Long invented weather: a seeded daily generator and its fit to a short record.
