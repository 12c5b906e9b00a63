//! Fitting a place and judging the fit: the search, the parameters, invented places whose truth is known, the scores.

#[path = "../support/mod.rs"]
mod support;
#[path = "../support/valleys.rs"]
mod valleys;

mod parameters;
mod place;
mod search;
mod skill;
mod trust;
