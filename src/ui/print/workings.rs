//! The workings on paper, and the publications they rest on.
//!
//! Each figure of a part stands under its name, and below it the steps which were put into it, through formulas, sums,
//! tables and choices alike, down to what was entered. A step which several parts have in common is printed once.

use super::super::markup::{self, nothing, several, tag};
use super::super::spot::{AirPart, FeederPart, Load, PanelPart, Spot, Traced};
use super::{Summary, headed, mark};
use crate::sheet::UnitSystem;
use crate::words::{self, page};
use crate::working::{Figure, Origin};
use leptos::prelude::*;
use std::collections::BTreeSet;
use std::sync::Arc;

/// A figure under its name, where there is one.
type Named = (String, Option<Traced>);

/// The steps while they are written out.
struct Steps {
    system: UnitSystem,
    /// The steps printed so far, of whatever part.
    printed: BTreeSet<String>,
}

impl Steps {
    /// One part: its figures, each once, and the steps below them which are new on the sheet.
    fn part(&mut self, head: String, figures: Vec<Named>) -> AnyView {
        let mut known = BTreeSet::new();
        let named: Vec<(String, Arc<Figure>, String)> = figures
            .into_iter()
            .filter_map(|(name, traced)| {
                let figure = figure_of(traced?)?;
                let flat = words::working_flat(&figure, self.system);
                known.insert(flat.clone()).then_some((name, figure, flat))
            })
            .collect();
        // Before any step is printed: what has a name of its own comes up under it.
        self.printed.append(&mut known);
        let mut lines = Vec::new();
        for (name, figure, flat) in named {
            lines.push(line(&name, &figure, &flat));
            self.below(&figure, &mut lines);
        }
        if lines.is_empty() {
            return nothing();
        }
        several(vec![
            tag("H3").say(head).done(),
            tag("UL").children(lines).done(),
        ])
    }

    fn below(&mut self, figure: &Figure, lines: &mut Vec<AnyView>) {
        for below in figures_below(figure) {
            let flat = words::working_flat(below, self.system);
            if self.printed.insert(flat.clone()) {
                lines.push(line(words::rule_title(below.rule), below, &flat));
                self.below(below, lines);
            }
        }
    }
}

impl Summary {
    /// Every figure with its working.
    pub(super) fn workings(&self) -> AnyView {
        let mut steps = Steps {
            system: self.system,
            printed: BTreeSet::new(),
        };
        let mut parts: Vec<AnyView> = Vec::new();
        for feeder in &self.worked.feeders {
            let figures = FeederPart::all()
                .into_iter()
                .map(|part| (part.name(), part.traced(feeder)))
                .collect();
            parts.push(steps.part(self.tag(feeder), figures));
        }
        let panel = PanelPart::all()
            .into_iter()
            .map(|part| (part.name(), Spot::Panel(part).traced(&self.worked)))
            .collect();
        parts.push(steps.part(page::heading_incoming().to_owned(), panel));
        for (load, counted) in [
            (Load::Running, page::head_running()),
            (Load::Connected, page::head_connected()),
        ] {
            let head = page::of_group(page::heading_enclosure(), counted);
            parts.push(steps.part(head, self.enclosure(load)));
        }
        let once = tag("P").text(page::print_steps_once()).done();
        let parts = tag("DIV").class("workings").children(parts).done();
        headed(page::print_workings(), several(vec![once, parts]))
    }

    /// The figures of the heat ledger, of the walls and of the air.
    fn enclosure(&self, load: Load) -> Vec<Named> {
        let traced = |spot: Spot| spot.traced(&self.worked);
        let groups = self.worked.ledger.rows.iter().map(|row| row.group);
        let mut figures: Vec<Named> = groups
            .map(|group| {
                let spot = Spot::Ledger(Some(group), load);
                (words::ledger_group(group).to_owned(), traced(spot))
            })
            .collect();
        let sum = traced(Spot::Ledger(None, load));
        figures.push((page::head_total().to_owned(), sum));
        figures.extend(AirPart::ALL.into_iter().map(|part| {
            let spot = Spot::Air(load, part);
            (part.name().to_owned(), traced(spot))
        }));
        figures
    }

    /// The publications behind all figures.
    pub(super) fn publications(&self) -> AnyView {
        let feeders = self.worked.feeders.iter().flat_map(|feeder| {
            FeederPart::all()
                .into_iter()
                .filter_map(|part| part.traced(feeder))
        });
        let panel = PanelPart::all().into_iter().map(Spot::Panel);
        let air = AirPart::ALL
            .into_iter()
            .map(|part| Spot::Air(Load::Running, part));
        let sheet = panel
            .chain(air)
            .filter_map(|spot| spot.traced(&self.worked));
        let mut names: BTreeSet<String> = BTreeSet::new();
        for figure in feeders.chain(sheet).filter_map(figure_of) {
            publications_of(&figure, &mut names);
        }
        let names = names.into_iter().map(|name| tag("LI").say(name).done());
        headed(
            page::print_sources(),
            tag("UL").class("publications").children(names).done(),
        )
    }
}

fn figure_of(traced: Traced) -> Option<Arc<Figure>> {
    match traced.origin {
        Origin::Figure(figure) => Some(figure),
        Origin::Entered(_) | Origin::Assumed(_) | Origin::Constant => None,
    }
}

fn figures_below(figure: &Figure) -> impl Iterator<Item = &Arc<Figure>> {
    figure.terms.iter().filter_map(|term| match &term.origin {
        Origin::Figure(below) => Some(below),
        Origin::Entered(_) | Origin::Assumed(_) | Origin::Constant => None,
    })
}

fn publications_of(figure: &Figure, names: &mut BTreeSet<String>) {
    names.insert(words::source_in_full(figure.rule.source));
    for below in figures_below(figure) {
        publications_of(below, names);
    }
}

/// A step under its name.
fn line(name: &str, figure: &Figure, flat: &str) -> AnyView {
    let named = tag("B")
        .say(name.to_owned())
        .children(mark(figure.ink))
        .text(": ");
    tag("LI").with(named).children(markup::formula(flat)).done()
}
