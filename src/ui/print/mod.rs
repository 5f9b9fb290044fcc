//! The printed summary: laid out from the sheet as it is when the browser prints, and cleared away afterwards.
//!
//! One table holds it all, so that its head, with sheet, issue, date and version, stands on each page. What is printed is
//! plain markup without signals. Workings stand in their own module.

mod workings;

use super::columns::{conductors, reactor};
use super::field::stand_in;
use super::markup::{self, nothing, several, tag};
use super::names;
use super::shared::Shared;
use super::shown::{Holding, Shown, Writing, grade_mark};
use super::spot::{AirPart, FeederPart, Load, PanelPart, RunPart, Spot, run_of};
use super::state::Page;
use crate::browser::{clock, page as window};
use crate::sheet::{Document, Home, UnitSystem, fields_of};
use crate::words::{self, Piece, page};
use crate::work::{Total, Worked, WorkedFeeder};
use crate::working::{Amount, Field, Figure, Grade, Holder, Ink, MarginNote, Place, Run, RunField};
use leptos::prelude::*;
use std::any::Any;
use std::cell::RefCell;

/// The id of the element in which the summary is laid out.
pub(super) const PAPER: &str = "paper";

thread_local! {
    /// What is laid out; dropped, it is cleared away.
    static LAID_OUT: RefCell<Option<Box<dyn Any>>> = const { RefCell::new(None) };
}

/// Lays the summary out, at once, since the browser prints what is there when this returns.
pub(super) fn lay_out(page: Page) {
    clear_away();
    let Some(paper) = window::element(PAPER) else {
        return;
    };
    let summary = Summary {
        document: page.peek(Document::clone),
        worked: page.worked.get_untracked(),
        notes: page
            .notes
            .with_untracked(|notes| notes.list().iter().map(|(_, note)| note.clone()).collect()),
        system: untrack(|| page.system()),
    };
    let laid_out = leptos::mount::mount_to(paper, move || summary.view());
    LAID_OUT.with(|held| held.replace(Some(Box::new(laid_out))));
}

/// Clears the summary away.
pub(super) fn clear_away() {
    LAID_OUT.with(RefCell::take);
}

/// What is printed.
struct Summary {
    document: Document,
    worked: Shared<Worked>,
    notes: Vec<MarginNote>,
    system: UnitSystem,
}

/// A cell of a printed table.
struct Printed {
    text: String,
    ink: Ink,
    is_number: bool,
    /// Marks with their shapes.
    marks: Vec<AnyView>,
}

fn words_cell(text: impl Into<String>) -> Printed {
    Printed {
        text: text.into(),
        ink: Ink::Worked,
        is_number: false,
        marks: Vec::new(),
    }
}

fn shown_cell(shown: &Shown, is_number: bool) -> Printed {
    Printed {
        ink: match shown {
            Shown::Value(ink, _) => *ink,
            Shown::Refused(_) | Shown::Nothing => Ink::Worked,
        },
        is_number,
        ..words_cell(shown.text())
    }
}

/// The head of a printed column: text, unit, whether its cells are numbers.
type Head = (&'static str, &'static str, bool);

impl Summary {
    fn view(&self) -> AnyView {
        let record = &self.document.sheet.record;
        let date = match record.text(Field::IssueDate) {
            "" => clock::today(),
            date => date.to_owned(),
        };
        let sheet = match record.text(Field::SheetName) {
            "" => page::untitled(),
            name => name,
        };
        let head = page::print_head(sheet, record.text(Field::Issue), &date);
        let version = format!("{} {}", page::print_version(), window::build());
        let sections = [
            self.title(sheet, &date),
            cautions(),
            self.totals(),
            self.conditions(),
            self.feeders(),
            self.entered(),
            self.protection(),
            self.heat_of_feeders(),
            self.incoming(),
            self.ledger(),
            self.sources(),
            self.air(),
            self.notes(),
            self.assumptions(),
            self.workings(),
            self.publications(),
            review(),
        ];
        let rows = sections
            .into_iter()
            .map(|section| tag("TR").with(tag("TD").child(section)).done());
        let running_head = tag("DIV")
            .class("running-head")
            .children([head, page::print_planning().to_owned(), version].map(span));
        tag("TABLE")
            .class("pages")
            .set("role", "presentation")
            .with(tag("THEAD").with(tag("TR").with(tag("TD").with(running_head))))
            .with(tag("TBODY").children(rows))
            .done()
    }

    fn holding(&self, holder: Holder) -> Holding<'_> {
        Holding {
            record: self.document.sheet.record(holder),
            drafts: &self.document.drafts,
            assumptions: &self.worked.assumptions,
            system: self.system,
        }
    }

    /// What counts at a place: a refused text counts for nothing, and stands among the notes.
    fn counting(&self, place: Place, writing: Writing) -> Shown {
        let traced = stand_in(place).and_then(|spot| spot.traced(&self.worked));
        let shown = self
            .holding(place.holder)
            .counting(place, traced.as_ref(), writing);
        match shown {
            Shown::Nothing => Shown::Value(Ink::Worked, words::gap(place.field).to_owned()),
            shown => shown,
        }
    }

    fn title(&self, sheet: &str, date: &str) -> AnyView {
        let record = &self.document.sheet.record;
        let parts = words::title_block()
            .iter()
            .filter(|field| !matches!(field, Field::SheetName | Field::Remark))
            .map(|field| {
                let shown = match field {
                    Field::IssueDate if record.get(Field::IssueDate).is_none() => {
                        Shown::Value(Ink::Worked, date.to_owned())
                    }
                    field => self.counting(of_sheet(*field), Writing::WithUnit),
                };
                tag("DIV")
                    .with(tag("DT").text(words::label(*field)))
                    .with(tag("DD").children(inked(&shown)))
                    .done()
            });
        let remark = record.text(Field::Remark);
        several(vec![
            tag("H1").text(page::print_title()).done(),
            tag("P").class("sheet-name").say(sheet.to_owned()).done(),
            tag("DL").class("title-parts").children(parts).done(),
            tag("P").class("remark").say(remark.to_owned()).done(),
            tag("P").class("inks").text(page::print_inks()).done(),
        ])
    }

    fn totals(&self) -> AnyView {
        let rows = self
            .worked
            .totals
            .iter()
            .map(|total| self.total(total))
            .collect();
        let counts = super::notes::Notes::new(self.notes.clone()).counts();
        let head: [Head; 5] = [
            (page::head_total(), "", false),
            (page::head_running(), "", true),
            (page::head_connected(), "", true),
            (page::head_limit(), "", true),
            (page::head_verdict(), "", false),
        ];
        several(vec![
            headed(page::heading_totals(), table(&head, rows)),
            tag("P")
                .class("counts")
                .say(format!("{}: {counts}", page::heading_notes()))
                .done(),
        ])
    }

    fn total(&self, total: &Total) -> Vec<Printed> {
        let texts = words::total_words(total, self.system);
        let number = |text: Option<String>| Printed {
            is_number: true,
            ..words_cell(text.unwrap_or_default())
        };
        let limit = texts
            .limit
            .map(|limit| page::limit_of(words::limit(total.kind), &limit));
        vec![
            words_cell(words::total(total.kind)),
            number(texts.running),
            number(texts.connected),
            number(limit),
            Printed {
                marks: vec![super::margin::verdict_mark(total.verdict)],
                ..words_cell("")
            },
        ]
    }

    fn conditions(&self) -> AnyView {
        let parts = [
            (page::heading_supply(), vec![words::supply_sentence()]),
            (
                page::heading_incoming(),
                vec![words::incoming_sentence(), words::main_sentence()],
            ),
            (page::heading_enclosure(), vec![words::enclosure_sentence()]),
        ];
        let parts = parts.into_iter().flat_map(|(head, sentences)| {
            let mut part = vec![tag("H3").text(head).done()];
            part.extend(
                sentences
                    .into_iter()
                    .map(|sentence| self.sentence(sentence)),
            );
            part
        });
        headed(page::print_conditions(), several(parts.collect()))
    }

    fn sentence(&self, sentence: Vec<Piece>) -> AnyView {
        let pieces = sentence.into_iter().flat_map(|piece| match piece {
            Piece::Text(text) => vec![markup::words(text.to_owned())],
            Piece::Field(field) => inked(&self.counting(of_sheet(field), Writing::InSentence)),
        });
        tag("P").class("sentence").children(pieces).done()
    }

    fn feeders(&self) -> AnyView {
        let fields = [
            Field::Tag,
            Field::Load,
            Field::Running,
            Field::MotorPower,
            Field::MotorCurrent,
            Field::DriveInput,
        ];
        let mut head: Vec<Head> = fields
            .iter()
            .map(|field| {
                let symbol = words::field_symbol(*field, self.system);
                (words::head(*field), symbol, !symbol.is_empty())
            })
            .collect();
        head.push((page::head_heat(), page::unit_heat(), true));
        head.push((page::head_margin(), "", false));
        let rows = self.each_feeder(|feeder| {
            let holder = Holder::Feeder(feeder.id);
            let mut row: Vec<Printed> = fields
                .iter()
                .zip(&head)
                .map(|(field, (_, _, is_number))| {
                    let place = Place {
                        holder,
                        field: *field,
                    };
                    let traced = stand_in(place).and_then(|spot| spot.traced(&self.worked));
                    let shown =
                        self.holding(place.holder)
                            .counting(place, traced.as_ref(), Writing::Bare);
                    shown_cell(&shown, *is_number)
                })
                .collect();
            row.push(self.part(feeder, FeederPart::Heat));
            let grades =
                super::shown::grades(self.notes.iter().filter(|note| note.place.holder == holder));
            row.push(Printed {
                marks: grades.into_iter().map(grade_mark).collect(),
                ..words_cell("")
            });
            row
        });
        let counts = super::feeders::counts(&self.document);
        several(vec![
            tag("H2")
                .say(format!("{} ", page::heading_feeders()))
                .with(tag("SMALL").say(counts))
                .done(),
            table(&head, rows),
        ])
    }

    /// What was entered for feeders and stands in no table, one paragraph for each. What is assumed is listed apart.
    fn entered(&self) -> AnyView {
        let mut fields: Vec<Field> = fields_of(Home::Feeder)
            .into_iter()
            .filter(|field| !stands_in_table(*field))
            .collect();
        // A remark ends with a full stop of its own.
        fields.sort_by_key(|field| *field == Field::FeederRemark);
        let lines: Vec<AnyView> = self
            .document
            .sheet
            .feeders
            .iter()
            .filter_map(|item| {
                let holder = Holder::Feeder(item.id);
                let entered = fields
                    .iter()
                    .filter(|field| item.record.get(**field).is_some());
                let line = self.entered_line(holder, entered);
                let named = tag("B").say(format!("{}. ", names::holder(&self.document, holder)));
                (!line.is_empty()).then(|| tag("P").with(named).say(line).done())
            })
            .collect();
        if lines.is_empty() {
            return nothing();
        }
        headed(page::print_entered(), several(lines))
    }

    /// Fields with their values; those of one run share its name.
    fn entered_line<'a>(&self, holder: Holder, fields: impl Iterator<Item = &'a Field>) -> String {
        let mut line = String::new();
        let mut run = None;
        for field in fields.copied() {
            let place = Place { holder, field };
            let shown = self
                .holding(holder)
                .counting(place, None, Writing::WithUnit);
            let of_run = words::label_in_run(field);
            let joint = if line.is_empty() { "" } else { "; " };
            let text = match of_run {
                Some((name, part)) if run == Some(name) => format!(", {part} {}", shown.text()),
                Some((name, part)) => format!("{joint}{name}: {part} {}", shown.text()),
                None => format!("{joint}{}: {}", words::label(field), shown.text()),
            };
            line.push_str(&text);
            run = of_run.map(|(name, _)| name);
        }
        line
    }

    fn protection(&self) -> AnyView {
        let length = words::field_symbol(Field::Run(Run::Ahead, RunField::Length), self.system);
        let current = words::field_symbol(Field::DriveInput, self.system);
        let rating = words::field_symbol(Field::ShortCircuitRating, self.system);
        let head: [Head; 11] = [
            (words::head(Field::Tag), "", false),
            (page::head_device(), "", false),
            (page::head_disconnect(), current, true),
            (page::print_run_ahead(), length, true),
            (page::head_conductors(), "", false),
            (page::head_ground(), "", false),
            (page::print_run_behind(), length, true),
            (page::head_conductors(), "", false),
            (page::head_ground(), "", false),
            (page::head_drop(), page::unit_drop(), true),
            (words::head(Field::ShortCircuitRating), rating, true),
        ];
        let rows = self.each_feeder(|feeder| {
            let mut row = vec![words_cell(self.tag(feeder)), self.device(feeder)];
            row.push(self.part(feeder, FeederPart::Disconnect));
            for (run, grounding) in [
                (Run::Ahead, FeederPart::Ahead(RunPart::Grounding)),
                (Run::Behind, FeederPart::Behind(RunPart::Grounding)),
            ] {
                let place = Place {
                    holder: Holder::Feeder(feeder.id),
                    field: Field::Run(run, RunField::Length),
                };
                let shown = self
                    .holding(place.holder)
                    .counting(place, None, Writing::Bare);
                row.push(shown_cell(&shown, true));
                row.push(shown_cell(
                    &run_of(feeder, run).map_or(Shown::Nothing, conductors),
                    false,
                ));
                let grounding = self.part(feeder, grounding);
                row.push(Printed {
                    is_number: false,
                    ..grounding
                });
            }
            row.push(self.part(feeder, FeederPart::DropRatio));
            let rating = Place {
                holder: Holder::Feeder(feeder.id),
                field: Field::ShortCircuitRating,
            };
            let rating = self
                .holding(rating.holder)
                .counting(rating, None, Writing::Bare);
            row.push(shown_cell(&rating, true));
            row
        });
        headed(page::heading_protection(), table(&head, rows))
    }

    fn heat_of_feeders(&self) -> AnyView {
        let parts = [
            (FeederPart::DriveLoss, page::drive_loss()),
            (FeederPart::DriveInside, page::drive_inside()),
            (FeederPart::ReactorHeat, page::reactor_heat()),
            (FeederPart::DeviceHeat, page::device_heat()),
            (FeederPart::ConductorHeat, page::conductor_heat()),
            (FeederPart::Heat, page::head_total()),
        ];
        let mut head: Vec<Head> = vec![
            (words::head(Field::Tag), "", false),
            (page::head_reactor(), page::unit_reactor(), false),
        ];
        head.extend(
            parts
                .iter()
                .map(|(_, name)| (*name, page::unit_heat(), true)),
        );
        let rows = self.each_feeder(|feeder| {
            let reactor = reactor(feeder, self.system);
            let mut row = vec![words_cell(self.tag(feeder)), shown_cell(&reactor, false)];
            row.extend(parts.iter().map(|(part, _)| self.part(feeder, *part)));
            row
        });
        headed(page::heading_reactors(), table(&head, rows))
    }

    fn incoming(&self) -> AnyView {
        let rows = PanelPart::all()
            .into_iter()
            .filter_map(|part| self.spot_row(part.name(), &[Spot::Panel(part)]))
            .collect();
        let head: [Head; 2] = [("", "", false), (page::head_value(), "", true)];
        headed(page::heading_incoming(), table(&head, rows))
    }

    fn ledger(&self) -> AnyView {
        let ledger = &self.worked.ledger;
        let of = |name: String, running: &Figure, connected: &Figure| {
            vec![
                words_cell(name),
                self.bare(running.value, running.ink),
                self.bare(connected.value, connected.ink),
            ]
        };
        let mut rows: Vec<Vec<Printed>> = ledger
            .rows
            .iter()
            .map(|row| {
                let name = format!("{} × {}", words::ledger_group(row.group), row.sources);
                of(name, &row.running, &row.connected)
            })
            .collect();
        rows.push(of(
            page::head_total().to_owned(),
            &ledger.running,
            &ledger.connected,
        ));
        if let Some(advised) = &ledger.advised_reactors {
            rows.push(vec![
                words_cell(page::ledger_advised()),
                self.bare(advised.value, advised.ink),
                words_cell(""),
            ]);
        }
        let head: [Head; 3] = [
            ("", "", false),
            (page::head_running(), page::unit_heat(), true),
            (page::head_connected(), page::unit_heat(), true),
        ];
        headed(page::heading_ledger(), table(&head, rows))
    }

    fn sources(&self) -> AnyView {
        if self.document.sheet.sources.is_empty() {
            return ().into_any();
        }
        let fields = fields_of(Home::Source);
        let mut head: Vec<Head> = fields
            .iter()
            .map(|field| {
                let symbol = words::field_symbol(*field, self.system);
                (words::head(*field), symbol, !symbol.is_empty())
            })
            .collect();
        head.push((page::head_heat(), page::unit_heat(), true));
        let rows = self
            .document
            .sheet
            .sources
            .iter()
            .map(|item| {
                let holder = Holder::Source(item.id);
                let mut row: Vec<Printed> = fields
                    .iter()
                    .zip(&head)
                    .map(|(field, (_, _, is_number))| {
                        let place = Place {
                            holder,
                            field: *field,
                        };
                        let shown = self
                            .holding(place.holder)
                            .counting(place, None, Writing::Bare);
                        shown_cell(&shown, *is_number)
                    })
                    .collect();
                row.push(match Spot::Source(item.id).traced(&self.worked) {
                    Some(traced) => self.bare(traced.amount, traced.ink()),
                    None => words_cell(page::not_worked()),
                });
                row
            })
            .collect();
        headed(page::heading_sources(), table(&head, rows))
    }

    fn air(&self) -> AnyView {
        let rows = AirPart::ALL
            .into_iter()
            .filter_map(|part| {
                let spots = [
                    Spot::Air(Load::Running, part),
                    Spot::Air(Load::Connected, part),
                ];
                self.spot_row(part.name().to_owned(), &spots)
            })
            .collect();
        let head: [Head; 3] = [
            ("", "", false),
            (page::head_running(), "", true),
            (page::head_connected(), "", true),
        ];
        headed(page::heading_air(), table(&head, rows))
    }

    fn notes(&self) -> AnyView {
        let mut notes: Vec<AnyView> = self.notes.iter().map(|note| self.note(note)).collect();
        if notes.is_empty() {
            notes.push(tag("P").text(page::no_notes()).done());
        }
        headed(page::heading_notes(), several(notes))
    }

    fn note(&self, note: &MarginNote) -> AnyView {
        let words = words::note(note, self.system);
        let place = words::place(&note.place, |id| names::item(&self.document, id));
        let answer = self
            .document
            .answers
            .iter()
            .find(|(named, _)| named.place == note.place && named.kind == note.kind.id())
            .map(|(_, answer)| answer.as_str());
        let answer = match (answer, note.grade) {
            (None, Grade::Note) => None,
            (answer, _) => Some(answer.unwrap_or(page::print_no_answer()).to_owned()),
        };
        let answer = answer.map(|answer| {
            tag("P")
                .class("answer")
                .with(tag("B").say(format!("{} ", page::print_answer())))
                .say(answer)
                .done()
        });
        tag("DIV")
            .class("printed-note")
            .with(
                tag("P")
                    .child(grade_mark(note.grade))
                    .with(tag("B").say(format!(" {place}. {}", words.what)))
                    .say(format!(" {} {}", words.why, words.remedy)),
            )
            .children(answer)
            .done()
    }

    fn assumptions(&self) -> AnyView {
        let lines = words::assumption_lines(&self.worked.assumptions, self.system, |id| {
            names::item(&self.document, id)
        });
        let rows: Vec<Vec<Printed>> = lines
            .into_iter()
            .map(|line| {
                vec![
                    words_cell(line.label),
                    Printed {
                        ink: Ink::Assumed,
                        ..words_cell(line.value)
                    },
                    words_cell(line.reason),
                    words_cell(line.holders.join(", ")),
                ]
            })
            .collect();
        if rows.is_empty() {
            let none = tag("P").text(page::no_assumptions()).done();
            return headed(page::heading_assumptions(), none);
        }
        let head: [Head; 4] = [
            (page::head_field(), "", false),
            (page::head_value(), "", false),
            (page::head_reason(), "", false),
            (page::head_of(), "", false),
        ];
        headed(page::heading_assumptions(), table(&head, rows))
    }

    fn each_feeder(&self, row: impl Fn(&WorkedFeeder) -> Vec<Printed>) -> Vec<Vec<Printed>> {
        self.worked
            .feeders
            .iter()
            .map(|feeder| row(feeder))
            .collect()
    }

    fn tag(&self, feeder: &WorkedFeeder) -> String {
        names::holder(&self.document, Holder::Feeder(feeder.id))
    }

    fn device(&self, feeder: &WorkedFeeder) -> Printed {
        let Some(device) = &feeder.device else {
            return words_cell(page::not_worked());
        };
        let ink = device
            .rating
            .as_ref()
            .map_or(Ink::Worked, |rating| rating.ink());
        Printed {
            ink,
            ..words_cell(
                words::branch_device(device, self.system)
                    .unwrap_or_else(|| page::none_fits().to_owned()),
            )
        }
    }

    fn part(&self, feeder: &WorkedFeeder, part: FeederPart) -> Printed {
        let Some(traced) = part.traced(feeder) else {
            return Printed {
                is_number: true,
                ..words_cell("–")
            };
        };
        let mut printed = self.bare(traced.amount, traced.ink());
        if part == FeederPart::Heat && !feeder.is_running {
            printed.text = page::standing_by_value(&printed.text);
        }
        printed
    }

    /// A value without its unit, which stands in the head; shares in per cent.
    fn bare(&self, amount: Amount, ink: Ink) -> Printed {
        Printed {
            ink,
            is_number: true,
            ..words_cell(super::shown::bare_text(amount, self.system))
        }
    }

    fn spot_row(&self, name: String, spots: &[Spot]) -> Option<Vec<Printed>> {
        let mut row = vec![words_cell(name)];
        let mut has_value = false;
        for spot in spots {
            let traced = spot.traced(&self.worked);
            has_value |= traced.is_some();
            row.push(match traced {
                Some(traced) => Printed {
                    ink: traced.ink(),
                    is_number: true,
                    ..words_cell(super::shown::text_with_unit(&traced, self.system))
                },
                None => words_cell(""),
            });
        }
        has_value.then_some(row)
    }
}

const fn of_sheet(field: Field) -> Place {
    Place {
        holder: Holder::Sheet,
        field,
    }
}

/// Whether an entered value of a feeder stands in a table as it was entered.
const fn stands_in_table(field: Field) -> bool {
    matches!(
        field,
        Field::Tag
            | Field::Load
            | Field::Running
            | Field::MotorPower
            | Field::MotorCurrent
            | Field::DriveInput
            | Field::ShortCircuitRating
            | Field::Run(_, RunField::Length)
    )
}

/// The mark of an ink on paper.
fn mark(ink: Ink) -> Option<AnyView> {
    let mark = match ink {
        Ink::Entered => page::print_mark_entered(),
        Ink::Assumed => page::print_mark_assumed(),
        Ink::Worked => return None,
    };
    Some(tag("SUP").text(mark).done())
}

fn inked(shown: &Shown) -> Vec<AnyView> {
    let ink = match shown {
        Shown::Value(ink, _) => *ink,
        Shown::Refused(_) | Shown::Nothing => Ink::Worked,
    };
    let mut inked = vec![
        tag("SPAN")
            .class(shown.class())
            .say(shown.text().to_owned())
            .done(),
    ];
    inked.extend(mark(ink));
    inked
}

fn span(text: String) -> AnyView {
    tag("SPAN").say(text).done()
}

fn headed(head: &'static str, content: AnyView) -> AnyView {
    several(vec![tag("H2").text(head).done(), content])
}

fn table(head: &[Head], rows: Vec<Vec<Printed>>) -> AnyView {
    if rows.is_empty() {
        return nothing();
    }
    let class = |is_number: bool| if is_number { "number" } else { "" };
    let head = head.iter().map(|(text, unit, is_number)| {
        tag("TH")
            .class(class(*is_number))
            .set("scope", "col")
            .say(format!("{text} "))
            .with(tag("SMALL").text(unit))
            .done()
    });
    let rows = rows.into_iter().map(|row| {
        let cells = row.into_iter().map(|cell| {
            tag("TD")
                .class(class(cell.is_number))
                .say(cell.text)
                .children(mark(cell.ink))
                .children(cell.marks)
                .done()
        });
        tag("TR").children(cells).done()
    });
    tag("TABLE")
        .class("printed")
        .with(tag("THEAD").with(tag("TR").children(head)))
        .with(tag("TBODY").children(rows))
        .done()
}

fn cautions() -> AnyView {
    tag("DIV")
        .class("printed-cautions")
        .with(tag("H2").text(page::heading_cautions()))
        .children(super::summary::caution_texts())
        .done()
}

/// Room for the reviewer.
fn review() -> AnyView {
    let lines = [
        page::print_prepared_by(),
        page::print_reviewed_by(),
        page::print_signature(),
        page::print_licence(),
        page::print_date(),
    ];
    let lines = lines.map(|label| {
        tag("DIV")
            .class("line")
            .child(span(label.to_owned()))
            .done()
    });
    tag("DIV")
        .class("review")
        .with(tag("H2").text(page::print_review()))
        .with(tag("DIV").class("lines").children(lines))
        .with(
            tag("DIV")
                .class("room")
                .child(span(page::print_remarks().to_owned())),
        )
        .with(tag("P").class("end").text(page::print_end()))
        .done()
}
