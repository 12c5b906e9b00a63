//! What a person sees: drawing on a frame buffer. Draws values; computes none.
