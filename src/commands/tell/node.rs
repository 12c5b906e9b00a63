//! A JSON value whose keys keep their order, so that people find things where they expect them.

use std::borrow::Cow;

use serde::Serialize;
use serde::ser::{SerializeMap, SerializeSeq, Serializer};

/// A value. A number that does not exist is written as null.
#[derive(Clone, Debug, PartialEq)]
pub(in crate::commands) enum Node {
    /// Nothing.
    Null,
    /// True or false.
    Flag(bool),
    /// A whole number.
    Whole(i64),
    /// A number.
    Number(f64),
    /// Text.
    Text(String),
    /// A list.
    List(Vec<Node>),
    /// Keys with their values, in order.
    Table(Vec<(Cow<'static, str>, Node)>),
}

impl Node {
    /// A table from keys and values.
    pub fn table<K: Into<Cow<'static, str>>>(entries: impl IntoIterator<Item = (K, Node)>) -> Node {
        Node::Table(entries.into_iter().map(|(key, node)| (key.into(), node)).collect())
    }
}

impl From<f64> for Node {
    fn from(number: f64) -> Self {
        Node::Number(number)
    }
}

impl From<usize> for Node {
    fn from(count: usize) -> Self {
        i64::try_from(count).map_or(Node::Null, Node::Whole)
    }
}

impl From<i32> for Node {
    fn from(number: i32) -> Self {
        Node::Whole(number.into())
    }
}

impl From<bool> for Node {
    fn from(flag: bool) -> Self {
        Node::Flag(flag)
    }
}

impl From<String> for Node {
    fn from(text: String) -> Self {
        Node::Text(text)
    }
}

impl From<&str> for Node {
    fn from(text: &str) -> Self {
        Node::Text(text.to_owned())
    }
}

impl<T: Into<Node>> From<Option<T>> for Node {
    fn from(value: Option<T>) -> Self {
        value.map_or(Node::Null, Into::into)
    }
}

impl Serialize for Node {
    fn serialize<S: Serializer>(&self, serializer: S) -> Result<S::Ok, S::Error> {
        match self {
            Node::Null => serializer.serialize_unit(),
            Node::Flag(flag) => serializer.serialize_bool(*flag),
            Node::Whole(number) => serializer.serialize_i64(*number),
            Node::Number(number) => serializer.serialize_f64(*number),
            Node::Text(text) => serializer.serialize_str(text),
            Node::List(nodes) => {
                let mut list = serializer.serialize_seq(Some(nodes.len()))?;
                nodes.iter().try_for_each(|node| list.serialize_element(node))?;
                list.end()
            }
            Node::Table(entries) => {
                let mut table = serializer.serialize_map(Some(entries.len()))?;
                entries.iter().try_for_each(|(key, node)| table.serialize_entry(key.as_ref(), node))?;
                table.end()
            }
        }
    }
}
