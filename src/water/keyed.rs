//! Enumerations whose members have a stable key in files.

/// Declares an enumeration with its list and stable keys.
macro_rules! keyed {
    ($(#[$meta:meta])* $name:ident, $count:ident { $($(#[$doc:meta])* $variant:ident => $key:literal,)+ }) => {
        $(#[$meta])*
        #[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord, Hash)]
        pub enum $name { $($(#[$doc])* $variant,)+ }

        /// How many there are.
        pub const $count: usize = [$($key),+].len();

        impl $name {
            /// All of them, in the order in which people read them.
            pub const ALL: [$name; $count] = [$($name::$variant),+];

            /// The stable key that files use.
            pub const fn key(self) -> &'static str {
                match self { $($name::$variant => $key,)+ }
            }
        }
    };
}

pub(crate) use keyed;
