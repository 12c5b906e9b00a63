//! What a crop asks for and uses: published single-coefficient curves, root zone and yield.
