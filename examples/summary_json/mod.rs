//! The worked sheet as JSON.
//!
//! Here: mirror types whose fields are the names of the JSON, and their making. Not here: anything worked out; a field
//! is what the core gave. Structs of the core, but for the sheet itself, are taken apart field by field, so that one
//! which gets a new field does not compile here until it has its place. DEVELOPERS.md describes every field.

mod feeder;
mod panel;
mod value;

use feeder::{Feeder, feeder};
use panel::{Enclosure, Fault, Incoming, Ledger, enclosure, fault, incoming, ledger};
use serde::Serialize;
use serde_json::ser::PrettyFormatter;
use std::io::{self, Write};
use value::{Value, Writer};
use ventrail::assume::Assumption;
use ventrail::file::field_name;
use ventrail::sheet::{Choice, Document, NoteRef, UnitSystem};
use ventrail::words;
use ventrail::work::{Total, TotalKind, Verdict, Worked, WorkedSource, work_out};
use ventrail::working::{Caution, Field, Grade, Holder, HolderId, MarginNote, Place};

/// The number of this layout.
const LAYOUT: u32 = 1;

#[derive(Serialize)]
struct Summary<'a> {
    layout: u32,
    program: &'static str,
    sheet: SheetHead,
    totals: Vec<TotalLine<'a>>,
    incoming: Incoming<'a>,
    fault: Fault<'a>,
    #[serde(skip_serializing_if = "Option::is_none")]
    lowest_rating: Option<LowestRating<'a>>,
    ledger: Ledger<'a>,
    enclosure: Enclosure<'a>,
    feeders: Vec<Feeder<'a>>,
    sources: Vec<Source<'a>>,
    notes: Vec<Note<'a>>,
    assumptions: Vec<Assumed<'a>>,
    drafts: Vec<Draft>,
    cautions: Vec<CautionLine>,
}

#[derive(Serialize)]
struct SheetHead {
    name: String,
    job: String,
    issue: String,
    prepared_by: String,
    issue_date: String,
    remark: String,
    units: &'static str,
}

#[derive(Serialize)]
struct TotalLine<'a> {
    kind: &'static str,
    label: &'static str,
    verdict: &'static str,
    #[serde(skip_serializing_if = "Option::is_none")]
    running: Option<Value<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    connected: Option<Value<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    limit: Option<Value<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    figure: Option<Value<'a>>,
}

#[derive(Serialize)]
struct LowestRating<'a> {
    rating: Value<'a>,
    of: Vec<HolderName>,
}

#[derive(Serialize)]
struct Source<'a> {
    id: u32,
    name: String,
    is_running: bool,
    #[serde(skip_serializing_if = "Option::is_none")]
    heat: Option<Value<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    current: Option<Value<'a>>,
}

#[derive(Serialize)]
struct HolderName {
    holder: &'static str,
    #[serde(skip_serializing_if = "Option::is_none")]
    id: Option<u32>,
    #[serde(skip_serializing_if = "Option::is_none")]
    tag: Option<String>,
}

#[derive(Serialize)]
struct PlaceName {
    #[serde(flatten)]
    holder: HolderName,
    field: String,
}

#[derive(Serialize)]
struct Note<'a> {
    grade: &'static str,
    kind: &'static str,
    place: PlaceName,
    what: String,
    why: String,
    remedy: String,
    figures: Vec<Value<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    answer: Option<String>,
}

#[derive(Serialize)]
struct Assumed<'a> {
    place: PlaceName,
    #[serde(flatten)]
    value: Value<'a>,
    reason: &'static str,
}

#[derive(Serialize)]
struct Draft {
    place: PlaceName,
    text: String,
}

#[derive(Serialize)]
struct CautionLine {
    heading: &'static str,
    text: &'static str,
}

/// Writes the worked sheet of `document` as JSON.
pub fn write_summary(document: &Document, out: impl Write) -> io::Result<()> {
    let worked = work_out(&document.sheet);
    let mut notes = worked.notes.clone();
    notes.extend(document.draft_notes());
    notes.sort_by_key(|note| note.grade);
    let parts = Parts {
        names: Names { document },
        writer: Writer {
            system: match document.sheet.record.choice(Field::Units) {
                Some(Choice::Si) => UnitSystem::Si,
                _ => UnitSystem::Us,
            },
        },
        worked: &worked,
        notes: &notes,
    };
    let mut json = serde_json::Serializer::with_formatter(out, PrettyFormatter::with_indent(b" "));
    Ok(parts.whole().serialize(&mut json)?)
}

/// What the JSON is made of.
struct Parts<'a> {
    names: Names<'a>,
    writer: Writer,
    worked: &'a Worked,
    /// Those of the sheet and those about refused texts, gravest first.
    notes: &'a [MarginNote],
}

impl<'a> Parts<'a> {
    fn whole(&self) -> Summary<'a> {
        let Worked {
            feeders,
            sources,
            incoming: of_panel,
            fault: of_fault,
            lowest_rating,
            ledger: of_heat,
            enclosure: of_air,
            totals,
            assumptions,
            ..
        } = self.worked;
        let (writer, names) = (self.writer, &self.names);
        Summary {
            layout: LAYOUT,
            program: "ventrail",
            sheet: head(names.document, writer.system),
            totals: totals
                .iter()
                .map(|total| total_line(total, writer))
                .collect(),
            incoming: incoming(of_panel, writer),
            fault: fault(of_fault, writer),
            lowest_rating: lowest_rating
                .as_ref()
                .map(|(rating, holders)| LowestRating {
                    rating: writer.entered(*rating),
                    of: holders.iter().map(|holder| names.holder(*holder)).collect(),
                }),
            ledger: ledger(of_heat, writer),
            enclosure: enclosure(of_air, writer),
            feeders: feeders.iter().map(|one| feeder(one, writer)).collect(),
            sources: sources.iter().map(|one| source(one, writer)).collect(),
            notes: self.notes.iter().map(|note| self.note(note)).collect(),
            assumptions: assumptions.iter().map(|one| self.assumed(one)).collect(),
            drafts: self.drafts(),
            cautions: Caution::ALL.into_iter().map(caution_line).collect(),
        }
    }

    fn note(&self, note: &'a MarginNote) -> Note<'a> {
        let MarginNote {
            kind,
            grade,
            place,
            figures,
        } = note;
        let said = words::note(note, self.writer.system);
        let reference = NoteRef {
            place: *place,
            kind: kind.id().to_owned(),
        };
        Note {
            grade: match grade {
                Grade::Stop => "stop",
                Grade::Query => "query",
                Grade::Note => "note",
            },
            kind: kind.id(),
            place: self.names.place(*place),
            what: said.what,
            why: said.why,
            remedy: said.remedy,
            figures: figures
                .iter()
                .map(|figure| self.writer.figure(figure))
                .collect(),
            answer: self.names.document.answers.get(&reference).cloned(),
        }
    }

    fn assumed(&self, assumption: &Assumption) -> Assumed<'a> {
        let Assumption { place, value } = assumption;
        Assumed {
            place: self.names.place(*place),
            value: self.writer.assumed(place.field, value),
            reason: words::assumption_reason(place.field),
        }
    }

    fn drafts(&self) -> Vec<Draft> {
        let drafts = self.names.document.drafts.iter();
        drafts
            .map(|(place, text)| Draft {
                place: self.names.place(*place),
                text: text.clone(),
            })
            .collect()
    }
}

fn caution_line(caution: Caution) -> CautionLine {
    let words::CautionWords { heading, text } = words::caution(caution);
    CautionLine { heading, text }
}

fn head(document: &Document, system: UnitSystem) -> SheetHead {
    let text = |field| document.sheet.record.text(field).to_owned();
    SheetHead {
        name: text(Field::SheetName),
        job: text(Field::Job),
        issue: text(Field::Issue),
        prepared_by: text(Field::PreparedBy),
        issue_date: text(Field::IssueDate),
        remark: text(Field::Remark),
        units: match system {
            UnitSystem::Us => "us_customary",
            UnitSystem::Si => "si",
        },
    }
}

fn total_line<'a>(total: &'a Total, writer: Writer) -> TotalLine<'a> {
    let Total {
        kind,
        running,
        connected,
        figure,
        limit,
        verdict,
    } = total;
    TotalLine {
        kind: match kind {
            TotalKind::Heat => "heat",
            TotalKind::InsideTemperature => "inside_temperature",
            TotalKind::Airflow => "airflow",
            TotalKind::IncomingCurrent => "incoming_current",
            TotalKind::MainDevice => "main_device",
            TotalKind::FaultCurrent => "fault_current",
        },
        label: words::total(*kind),
        verdict: match verdict {
            Verdict::Within => "within",
            Verdict::Beyond => "beyond",
            Verdict::Unknown => "unknown",
            Verdict::NoLimit => "no_limit",
        },
        running: running.map(|amount| writer.bare(amount)),
        connected: connected.map(|amount| writer.bare(amount)),
        limit: limit.map(|amount| writer.bare(amount)),
        figure: figure.as_ref().map(|figure| writer.figure(figure)),
    }
}

fn source<'a>(worked: &'a WorkedSource, writer: Writer) -> Source<'a> {
    let WorkedSource {
        id,
        name,
        is_running,
        heat,
        current,
    } = worked;
    Source {
        id: id.0,
        name: name.clone(),
        is_running: *is_running,
        heat: writer.given(heat.as_ref()),
        current: writer.given(current.as_ref()),
    }
}

/// The names of feeders and sources.
struct Names<'a> {
    document: &'a Document,
}

impl Names<'_> {
    fn holder(&self, holder: Holder) -> HolderName {
        let name = |id: HolderId, field| {
            let text = self
                .document
                .sheet
                .record(holder)
                .map(|record| record.text(field));
            (
                Some(id.0),
                text.filter(|text| !text.is_empty()).map(str::to_owned),
            )
        };
        let (holder, (id, tag)) = match holder {
            Holder::Sheet => ("sheet", (None, None)),
            Holder::Feeder(id) => ("feeder", name(id, Field::Tag)),
            Holder::Source(id) => ("source", name(id, Field::SourceName)),
        };
        HolderName { holder, id, tag }
    }

    fn place(&self, place: Place) -> PlaceName {
        PlaceName {
            holder: self.holder(place.holder),
            field: field_name(place.field).into_owned(),
        }
    }
}
