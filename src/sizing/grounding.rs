//! The equipment grounding conductor of a run, with its growth where the phases were enlarged.

use crate::quantity::{CrossSection, Current, Ratio, WireSize};
use crate::sizing::conductor::Conductors;
use crate::sizing::rules;
use crate::tables::nec_chapter_9::{area, size_of_area};
use crate::tables::nec_conductors::grounding_conductor;
use crate::working::{Field, Figure, Given, Grade, MarginNote, NoteKind, RunField, Term};
use std::sync::Arc;

/// Sizes the grounding conductor of `conductors` behind a device of `rating`; of the same metal as the phases.
///
/// Growth, editions 2020 and 2023: the ratio of the installed area to that of the smallest size after ambient and count,
/// so that enlargement for those alone does not count, and enlargement for voltage drop or by choice does.
/// Source: NEC 2023, 250.122(A) and (B). `None` where the phases have no size, or the table no row (with a `stop`).
pub fn grounding_of(
    conductors: &Conductors,
    rating: &Given<Current>,
    notes: &mut Vec<MarginNote>,
) -> Option<Arc<Figure>> {
    let run = conductors.input.run;
    let metal = conductors.input.metal.value;
    let installed = conductors.installed()?;
    let field = Field::Run(run, RunField::Size);
    let Some(by_table) = grounding_conductor(rating.value, metal) else {
        notes.push(MarginNote::new(
            Grade::Stop,
            field,
            NoteKind::GroundingBeyondTable {
                rating: rating.value,
            },
        ));
        return None;
    };
    let table = Arc::new(rules::GROUNDING_TABLE.figure(by_table, [rating.term("I_n")]));
    let grown = grown_area(conductors, installed, &table, by_table);
    let wanted = match &grown {
        Some((_, wanted)) => *wanted,
        None => area(by_table),
    };
    // Where no size has the area, the cap below decides all the same.
    let uncapped = size_of_area(wanted).unwrap_or(installed);
    let size = uncapped.min(installed);
    // A table size above the phase is everyday on motor circuits; a growth which stops there is worth a word.
    if size < uncapped && grown.is_some() {
        notes.push(MarginNote::new(
            Grade::Note,
            field,
            NoteKind::GroundingCapped { run, size },
        ));
    }
    let mut terms = vec![Term::of("table", &table)];
    terms.extend(grown.map(|(figure, _)| Term::of("A_g", &figure)));
    terms.push(Term::constant("phase", installed));
    Some(Arc::new(rules::GROUNDING_SIZE.figure(size, terms)))
}

/// The area which the enlarged phases ask for; `None` where they were not enlarged.
fn grown_area(
    conductors: &Conductors,
    installed: WireSize,
    table: &Arc<Figure>,
    by_table: WireSize,
) -> Option<(Arc<Figure>, CrossSection)> {
    let smallest = conductors.smallest()?;
    if installed <= smallest {
        return None;
    }
    let sets = &conductors.input.sets;
    let ratio: Ratio = area(installed) / area(smallest);
    let area_of = |size: WireSize| {
        Arc::new(rules::TABLE_8_AREA.figure(area(size), [Term::constant("size", size)]))
    };
    let ratio_figure = Arc::new(rules::GROUNDING_RATIO.figure(
        ratio,
        [
            sets.term("n_i"),
            Term::of("A_i", &area_of(installed)),
            sets.term("n_s"),
            Term::of("A_s", &area_of(smallest)),
        ],
    ));
    let table_area =
        Arc::new(rules::TABLE_8_AREA.figure(area(by_table), [Term::of("size", table)]));
    let wanted = ratio * area(by_table);
    let grown = rules::GROUNDING_AREA.figure(
        wanted,
        [Term::of("r", &ratio_figure), Term::of("A_t", &table_area)],
    );
    Some((Arc::new(grown), wanted))
}
