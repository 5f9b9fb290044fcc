//! The heat ledger: every source of heat inside, by group, running together and connected.

use super::feeder::{Feeder, shown_tag};
use super::{Ledger, LedgerGroup, LedgerRow, WorkedSource};
use crate::quantity::Power;
use crate::sizing::heat::sum_of_heats;
use crate::sizing::rules;
use crate::working::{Given, Term};

/// Heat of one source with its group.
struct Entry {
    group: LedgerGroup,
    is_running: bool,
    term: Term,
}

/// Sums the heat of feeders, other sources, main device and sun.
pub(super) fn ledger_of(
    feeders: &[Feeder],
    sources: &[WorkedSource],
    main: Option<&Given<Power>>,
    sun: Option<&Given<Power>>,
) -> Ledger {
    let entries: Vec<Entry> = feeders
        .iter()
        .flat_map(feeder_entries)
        .chain(sources.iter().filter_map(|source| {
            Some(Entry {
                group: LedgerGroup::Others,
                is_running: source.is_running,
                term: source
                    .heat
                    .as_ref()?
                    .term("P")
                    .belonging_to(&source.name.as_str().into()),
            })
        }))
        .chain(always(LedgerGroup::Devices, main))
        .chain(always(LedgerGroup::Sun, sun))
        .collect();
    let rows: Vec<LedgerRow> = GROUPS
        .into_iter()
        .filter_map(|group| row_of(group, &entries))
        .collect();
    let running = rows.iter().map(|row| Term::of("P", &row.running)).collect();
    let connected = rows
        .iter()
        .map(|row| Term::of("P", &row.connected))
        .collect();
    let advised: Vec<Term> = feeders
        .iter()
        .filter_map(|feeder| feeder.worked.reactor.advised.as_ref()?.heat.as_ref())
        .map(|heat| heat.term("P"))
        .collect();
    Ledger {
        running: sum_of_heats(&rules::LEDGER_SUM, running),
        connected: sum_of_heats(&rules::LEDGER_SUM, connected),
        advised_reactors: (!advised.is_empty()).then(|| sum_of_heats(&rules::LEDGER_SUM, advised)),
        rows,
    }
}

const GROUPS: [LedgerGroup; 6] = [
    LedgerGroup::Drives,
    LedgerGroup::Reactors,
    LedgerGroup::Devices,
    LedgerGroup::Conductors,
    LedgerGroup::Others,
    LedgerGroup::Sun,
];

fn feeder_entries(feeder: &Feeder) -> impl Iterator<Item = Entry> {
    let heat = &feeder.worked.heat;
    let is_running = feeder.worked.is_running;
    let tag = shown_tag(&feeder.worked.tag, feeder.worked.id);
    [
        (
            LedgerGroup::Drives,
            heat.drive_inside
                .as_ref()
                .map(|figure| Term::of("P", figure)),
        ),
        (
            LedgerGroup::Reactors,
            heat.reactor.as_ref().map(|loss| loss.term("P")),
        ),
        (
            LedgerGroup::Devices,
            heat.device.as_ref().map(|loss| loss.term("P")),
        ),
        (
            LedgerGroup::Conductors,
            heat.conductors.as_ref().map(|figure| Term::of("P", figure)),
        ),
    ]
    .into_iter()
    .filter_map(move |(group, term)| {
        Some(Entry {
            group,
            is_running,
            term: term?.belonging_to(&tag),
        })
    })
}

fn always(group: LedgerGroup, heat: Option<&Given<Power>>) -> Option<Entry> {
    Some(Entry {
        group,
        is_running: true,
        term: heat?.term("P"),
    })
}

fn row_of(group: LedgerGroup, entries: &[Entry]) -> Option<LedgerRow> {
    let of_group = || entries.iter().filter(|entry| entry.group == group);
    let terms = |counts: fn(&Entry) -> bool| -> Vec<Term> {
        of_group()
            .filter(|entry| counts(entry))
            .map(|entry| entry.term.clone())
            .collect()
    };
    let sources = u32::try_from(of_group().count()).unwrap_or(u32::MAX);
    (sources > 0).then(|| LedgerRow {
        group,
        sources,
        running: sum_of_heats(&rules::LEDGER_SUM, terms(|entry| entry.is_running)),
        connected: sum_of_heats(&rules::LEDGER_SUM, terms(|_| true)),
    })
}
