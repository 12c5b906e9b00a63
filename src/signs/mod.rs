//! What is read off a run: annual indicators, comparisons and skill scores.
