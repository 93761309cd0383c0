//! CSV (RFC 4180): a header with the keys of the JSON, then a row each. Absent values are empty, lists are joined by `; `.

use serde_json::{Map, Value};

use super::json;
use crate::report::schedule::Schedule;
use crate::report::schedule::row::Row;
use crate::section::catalogue::CatalogueRow;

/// The rows of a schedule.
#[must_use]
pub fn schedule(schedule: &Schedule) -> String {
    written(json::object(&Row::default()), schedule.members.iter().map(json::object))
}

/// Rows of the section tables.
#[must_use]
pub fn sections(rows: &[&CatalogueRow]) -> String {
    let header = rows.first().map(|row| json::section(row)).unwrap_or_default();
    written(header, rows.iter().map(|row| json::section(row)))
}

/// Text with the keys of `header` and the values of the rows under them.
fn written(header: Map<String, Value>, rows: impl Iterator<Item = Map<String, Value>>) -> String {
    let mut writer = ::csv::WriterBuilder::new()
        .terminator(::csv::Terminator::CRLF)
        .from_writer(Vec::new());
    // Writing into memory can fail only by a row of another length, and all have the header's.
    let _ = writer.write_record(header.keys());
    for row in rows {
        let _ = writer.write_record(header.keys().map(|key| cell(row.get(key).unwrap_or(&Value::Null))));
    }
    String::from_utf8(writer.into_inner().unwrap_or_default()).unwrap_or_default()
}

fn cell(value: &Value) -> String {
    match value {
        Value::Null => String::new(),
        Value::String(text) => text.clone(),
        Value::Array(list) => list.iter().map(cell).collect::<Vec<_>>().join("; "),
        other => other.to_string(),
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn what_divides_cells_is_quoted() {
        let row = |text: &str| Row {
            mark: Some(text.to_owned()),
            length_m: Some(0.1),
            ..Row::default()
        };
        let members = vec![row("B\"1\", the\r\nfirst"), row("梁")];
        let text = schedule(&Schedule {
            members,
            ..Schedule::default()
        });
        let mut reader = ::csv::Reader::from_reader(text.as_bytes());
        let marks: Vec<String> = reader.records().map(|record| record.unwrap()[0].to_owned()).collect();
        assert_eq!(marks, ["B\"1\", the\r\nfirst", "梁"]);
        assert!(text.starts_with("mark,count,length_m,section,") && text.ends_with("\r\n"));
        assert!(text.contains("\"B\"\"1\"\", the\r\nfirst\",,0.1,,"));
    }

    #[test]
    fn without_members_there_is_a_header_still() {
        assert_eq!(schedule(&Schedule::default()).lines().count(), 1);
    }
}
