//! What a locale file promises: its messages, their attributes and the arguments that each takes.

use std::collections::{BTreeMap, BTreeSet};

use fluent_syntax::ast::{CallArguments, Entry, Expression, InlineExpression, Pattern, PatternElement, Resource};
use fluent_syntax::parser;

/// Deeper nesting than any sentence needs; the parser recurses, so a hostile file must not get that far.
const DEEPEST_NESTING: usize = 32;

/// The parts of one message, each with the names of its arguments. The part `""` is the message's own text; the others
/// are its attributes.
pub type Shape = BTreeMap<String, BTreeSet<String>>;

/// A line of a locale file that is not Fluent.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct SyntaxError {
    /// Counted from 1.
    pub line: usize,
}

/// Every message of a Fluent file, in order, with its shape; and the lines that do not parse.
pub fn shapes(text: &str) -> (Vec<(String, Shape)>, Vec<SyntaxError>) {
    if let Some(line) = too_deep(text) {
        return (Vec::new(), vec![SyntaxError { line }]);
    }
    let (resource, errors) = match parser::parse_runtime(text) {
        Ok(resource) => (resource, Vec::new()),
        Err((resource, errors)) => (resource, errors),
    };
    let line_at = |position: usize| 1 + text.bytes().take(position).filter(|byte| *byte == b'\n').count();
    let errors = errors.iter().map(|error| SyntaxError { line: line_at(error.pos.start) }).collect();
    (shapes_of(&resource), errors)
}

/// Whether a file must not be handed to the parser.
pub(super) fn is_too_deep(text: &str) -> bool {
    too_deep(text).is_some()
}

/// The line on which braces and calls nest too deep to be a message, if any.
fn too_deep(text: &str) -> Option<usize> {
    let mut depth = 0_usize;
    for (index, line) in text.lines().enumerate() {
        // The parser gives up an open brace at a comment or at the start of a message, and nowhere else.
        if line.starts_with('#') || starts_message(line) {
            depth = 0;
        }
        if line.starts_with('#') {
            continue;
        }
        for byte in line.bytes() {
            match byte {
                b'{' => depth += 1,
                // A parenthesis calls a function within braces and is plain text outside.
                b'(' if depth > 0 => depth += 1,
                b'}' | b')' => depth = depth.saturating_sub(1),
                _ => {}
            }
            if depth > DEEPEST_NESTING {
                return Some(index + 1);
            }
        }
    }
    None
}

fn starts_message(line: &str) -> bool {
    let name = line.split('=').next().unwrap_or_default().trim_end_matches(' ');
    let letters = |byte: u8| byte.is_ascii_alphanumeric() || byte == b'-' || byte == b'_';
    name.len() < line.len() && !name.is_empty() && name.bytes().all(letters)
}

fn shapes_of(resource: &Resource<&str>) -> Vec<(String, Shape)> {
    let mut shapes = Vec::new();
    for entry in &resource.body {
        let Entry::Message(message) = entry else { continue };
        let mut shape = Shape::new();
        if let Some(value) = &message.value {
            shape.insert(String::new(), arguments_of(value));
        }
        for attribute in &message.attributes {
            shape.insert(attribute.id.name.to_owned(), arguments_of(&attribute.value));
        }
        shapes.push((message.id.name.to_owned(), shape));
    }
    shapes
}

fn arguments_of(pattern: &Pattern<&str>) -> BTreeSet<String> {
    let mut names = BTreeSet::new();
    collect_pattern(pattern, &mut names);
    names
}

fn collect_pattern(pattern: &Pattern<&str>, names: &mut BTreeSet<String>) {
    for element in &pattern.elements {
        if let PatternElement::Placeable { expression } = element {
            collect_expression(expression, names);
        }
    }
}

fn collect_expression(expression: &Expression<&str>, names: &mut BTreeSet<String>) {
    match expression {
        Expression::Inline(inline) => collect_inline(inline, names),
        Expression::Select { selector, variants } => {
            collect_inline(selector, names);
            for variant in variants {
                collect_pattern(&variant.value, names);
            }
        }
    }
}

fn collect_inline(inline: &InlineExpression<&str>, names: &mut BTreeSet<String>) {
    match inline {
        InlineExpression::VariableReference { id } => {
            names.insert(id.name.to_owned());
        }
        InlineExpression::Placeable { expression } => collect_expression(expression, names),
        InlineExpression::FunctionReference { arguments, .. } => collect_call(arguments, names),
        InlineExpression::TermReference { arguments: Some(arguments), .. } => collect_call(arguments, names),
        _ => {}
    }
}

fn collect_call(arguments: &CallArguments<&str>, names: &mut BTreeSet<String>) {
    for positional in &arguments.positional {
        collect_inline(positional, names);
    }
    for named in &arguments.named {
        collect_inline(&named.value, names);
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn arguments_are_found_in_variants_and_attributes() {
        let text =
            "late = { $n ->\n    [one] { $n } day\n   *[other] { $n } days for { $who }\n}\n    .short = { $who }\n";
        let (shapes, errors) = shapes(text);
        assert!(errors.is_empty());
        let (id, shape) = &shapes[0];
        assert_eq!(id, "late");
        assert_eq!(shape[""], BTreeSet::from(["n".to_owned(), "who".to_owned()]));
        assert_eq!(shape["short"], BTreeSet::from(["who".to_owned()]));
    }

    #[test]
    fn a_broken_line_is_named_and_the_rest_is_read() {
        let (found, errors) = shapes("one = 1\n\ntwo 2\n\nthree = 3\n");
        assert_eq!(errors, [SyntaxError { line: 3 }]);
        assert_eq!(found.iter().map(|(id, _)| id.as_str()).collect::<Vec<_>>(), ["one", "three"]);
    }

    #[test]
    fn a_bomb_of_braces_is_refused_before_it_is_parsed() {
        for bomb in ["{", "{\n", "{ $n ->\n[one] ", "{ F(", "{ $n ->\n *[a-b] "] {
            let (found, errors) = shapes(&format!("one = {}", bomb.repeat(100_000)));
            assert!(found.is_empty(), "{bomb}");
            assert_eq!(errors.len(), 1, "{bomb}");
        }
        let (found, errors) = shapes(&format!("one = {{ {}", "F(".repeat(100_000)));
        assert!(found.is_empty());
        assert_eq!(errors, [SyntaxError { line: 1 }]);
    }
}
