//! Spots: everything on the page whose working can be read, named so that the name outlives an edit.
//!
//! Here: the names, the texts for them, and how the worked sheet answers to each. Not here: how a working is shown.
//! Start with [`Spot::traced`].

use crate::sheet::Document;
use crate::sizing::air::Air;
use crate::sizing::conductor::Conductors;
use crate::sizing::panel::MainDevice;
use crate::sizing::reactor::ReactorSize;
use crate::words::{self, page};
use crate::work::{LedgerGroup, TotalKind, Worked, WorkedFeeder};
use crate::working::{Amount, Figure, Given, Holder, HolderId, Ink, Origin, Place, Run};
use std::sync::Arc;

/// Something with a working.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum Spot {
    /// A figure of a feeder.
    Feeder(HolderId, FeederPart),
    /// A figure of the incoming circuit or of the fault current.
    Panel(PanelPart),
    /// A figure of walls and air.
    Air(Load, AirPart),
    /// A group of the heat ledger, or its sum.
    Ledger(Option<LedgerGroup>, Load),
    /// The heat of advised reactors beside the ledger.
    AdvisedReactors,
    /// The heat of another source.
    Source(HolderId),
    /// A total at the head of the margin.
    Total(TotalKind),
    /// A field, entered or assumed.
    Field(Place),
}

/// A value with where it came from.
#[derive(Debug, Clone, PartialEq)]
pub(super) struct Traced {
    pub(super) amount: Amount,
    pub(super) origin: Origin,
}

impl Traced {
    /// The ink in which the value is shown.
    pub(super) fn ink(&self) -> Ink {
        match &self.origin {
            Origin::Entered(_) => Ink::Entered,
            Origin::Assumed(_) => Ink::Assumed,
            Origin::Constant => Ink::Worked,
            Origin::Figure(figure) => figure.ink,
        }
    }
}

/// What is counted: what runs together, or everything connected.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum Load {
    Running,
    Connected,
}

/// A figure of a run of conductors.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum RunPart {
    Required,
    Size,
    Ampacity,
    Grounding,
    Drop,
    DropRatio,
    Heat,
}

/// A figure of a reactor.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum ReactorPart {
    Inductance,
    Current,
    Heat,
}

/// A figure of a feeder.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum FeederPart {
    MotorCurrent,
    DriveInput,
    Ahead(RunPart),
    Behind(RunPart),
    DropRatio,
    DeviceProduct,
    DeviceLargest,
    DeviceRating,
    Disconnect,
    SourceRatio,
    SourceImpedance,
    ReactorEntered(ReactorPart),
    ReactorAdvised(ReactorPart),
    DriveLoss,
    DriveInside,
    ReactorHeat,
    DeviceHeat,
    ConductorHeat,
    Heat,
}

/// A figure of the incoming circuit or of the fault current.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum PanelPart {
    Running,
    Connected,
    Incoming(RunPart),
    RequiredConnected,
    MainSum,
    MainSumByInputs,
    MainLargest,
    MainRating,
    TransformerCurrent,
    AtSource,
    RunFactor,
    Multiplier,
    AtPanel,
}

/// A figure of walls and air.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum AirPart {
    Surface,
    Conductance,
    SealedRise,
    SealedInside,
    Inside,
    Pressure,
    Density,
    Airflow,
    AirflowCredited,
    AirflowMetricRule,
    AirflowUsRule,
}

impl Spot {
    /// The worked value at this spot; `None` where there is none, and for fields.
    pub(super) fn traced(self, worked: &Worked) -> Option<Traced> {
        let figure = match self {
            Spot::Feeder(id, part) => return part.traced(feeder(worked, id)?),
            Spot::Panel(part) => return part.traced(worked),
            // A sealed enclosure moves no air.
            Spot::Air(_, part) if part.is_of_fans() && !worked.enclosure.is_ventilated => None,
            Spot::Air(load, part) => return part.traced(air(worked, load)),
            Spot::Ledger(None, Load::Running) => Some(Arc::clone(&worked.ledger.running)),
            Spot::Ledger(None, Load::Connected) => Some(Arc::clone(&worked.ledger.connected)),
            Spot::Ledger(Some(group), load) => {
                let row = worked.ledger.rows.iter().find(|row| row.group == group)?;
                Some(Arc::clone(match load {
                    Load::Running => &row.running,
                    Load::Connected => &row.connected,
                }))
            }
            Spot::AdvisedReactors => worked.ledger.advised_reactors.clone(),
            Spot::Source(id) => {
                let source = worked.sources.iter().find(|source| source.id == id)?;
                return given(source.heat.as_ref());
            }
            Spot::Total(kind) => {
                let total = worked.totals.iter().find(|total| total.kind == kind)?;
                total.figure.clone()
            }
            Spot::Field(_) => None,
        };
        trace(figure.as_ref())
    }

    /// The run whose installed size this spot is.
    pub(super) fn conductors(self, worked: &Worked) -> Option<&Conductors> {
        match self {
            Spot::Feeder(id, FeederPart::Ahead(RunPart::Size)) => {
                feeder(worked, id)?.ahead.as_ref()
            }
            Spot::Feeder(id, FeederPart::Behind(RunPart::Size)) => {
                feeder(worked, id)?.behind.as_ref()
            }
            Spot::Panel(PanelPart::Incoming(RunPart::Size)) => worked.incoming.conductors.as_ref(),
            _ => None,
        }
    }

    /// What the spot is called, with the tag of its feeder.
    pub(super) fn name(self, document: &Document) -> String {
        match self {
            Spot::Feeder(id, part) => {
                let tag = super::names::holder(document, Holder::Feeder(id));
                page::of_feeder(&tag, &part.name())
            }
            Spot::Panel(part) => part.name(),
            Spot::Air(_, part) => part.name().to_owned(),
            Spot::Ledger(group, load) => {
                let counted = match load {
                    Load::Running => page::head_running(),
                    Load::Connected => page::head_connected(),
                };
                let group = group.map_or(page::heading_ledger(), words::ledger_group);
                page::of_group(group, counted)
            }
            Spot::AdvisedReactors => page::ledger_advised().to_owned(),
            Spot::Source(id) => super::names::holder(document, Holder::Source(id)),
            Spot::Total(kind) => words::total(kind).to_owned(),
            Spot::Field(place) => match place.holder {
                Holder::Sheet => words::label(place.field).to_owned(),
                holder => page::of_feeder(
                    &super::names::holder(document, holder),
                    words::label(place.field),
                ),
            },
        }
    }
}

impl RunPart {
    pub(super) const ALL: [RunPart; 7] = [
        RunPart::Required,
        RunPart::Size,
        RunPart::Ampacity,
        RunPart::Grounding,
        RunPart::Drop,
        RunPart::DropRatio,
        RunPart::Heat,
    ];

    fn traced(self, run: &Conductors) -> Option<Traced> {
        let figure = match self {
            RunPart::Required => Some(&run.required),
            RunPart::Size => run.size.as_ref(),
            RunPart::Ampacity => run.ampacity.as_ref(),
            RunPart::Grounding => run.grounding.as_ref(),
            RunPart::Drop => run.drop.as_ref(),
            RunPart::DropRatio => run.drop_ratio.as_ref(),
            RunPart::Heat => run.heat.as_ref(),
        };
        trace(figure)
    }

    /// The name within its run.
    pub(super) const fn name(self) -> &'static str {
        match self {
            RunPart::Required => page::required_ampacity(),
            RunPart::Size => page::size(),
            RunPart::Ampacity => page::usable_ampacity(),
            RunPart::Grounding => page::grounding_conductor(),
            RunPart::Drop => page::voltage_drop(),
            RunPart::DropRatio => page::voltage_drop_share(),
            RunPart::Heat => page::heat_of_run(),
        }
    }
}

impl ReactorPart {
    pub(super) const ALL: [ReactorPart; 3] = [
        ReactorPart::Inductance,
        ReactorPart::Current,
        ReactorPart::Heat,
    ];

    fn traced(self, reactor: &ReactorSize) -> Option<Traced> {
        match self {
            ReactorPart::Inductance => trace(Some(&reactor.inductance)),
            ReactorPart::Current => trace(Some(&reactor.rated_current)),
            ReactorPart::Heat => given(reactor.heat.as_ref()),
        }
    }

    const fn name(self) -> &'static str {
        match self {
            ReactorPart::Inductance => page::inductance(),
            ReactorPart::Current => page::reactor_rated_current(),
            ReactorPart::Heat => page::reactor_heat(),
        }
    }
}

impl FeederPart {
    pub(super) fn traced(self, feeder: &WorkedFeeder) -> Option<Traced> {
        let reactor = &feeder.reactor;
        let heat = &feeder.heat;
        let figure = match self {
            FeederPart::MotorCurrent => return given(feeder.motor_current.as_ref()),
            FeederPart::DriveInput => return given(feeder.drive_input.as_ref()),
            FeederPart::Ahead(part) => return part.traced(feeder.ahead.as_ref()?),
            FeederPart::Behind(part) => return part.traced(feeder.behind.as_ref()?),
            FeederPart::DeviceRating => return given(feeder.device.as_ref()?.rating.as_ref()),
            FeederPart::ReactorEntered(part) => return part.traced(reactor.entered.as_ref()?),
            FeederPart::ReactorAdvised(part) => return part.traced(reactor.advised.as_ref()?),
            FeederPart::DropRatio => feeder.drop_ratio.as_ref(),
            FeederPart::DeviceProduct => Some(&feeder.device.as_ref()?.product),
            FeederPart::DeviceLargest => feeder.device.as_ref()?.largest.as_ref(),
            FeederPart::Disconnect => feeder.disconnect.as_ref(),
            FeederPart::SourceRatio => reactor.source_ratio.as_ref(),
            FeederPart::SourceImpedance => reactor.source_impedance.as_ref(),
            FeederPart::DriveLoss => return given(heat.drive.as_ref()),
            FeederPart::ReactorHeat => return given(heat.reactor.as_ref()),
            FeederPart::DeviceHeat => return given(heat.device.as_ref()),
            FeederPart::DriveInside => heat.drive_inside.as_ref(),
            FeederPart::ConductorHeat => heat.conductors.as_ref(),
            FeederPart::Heat => heat.total.as_ref(),
        };
        trace(figure)
    }

    /// The name within its feeder.
    pub(super) fn name(self) -> String {
        let plain = match self {
            FeederPart::Ahead(part) => {
                return page::of_group(page::conductors_ahead(), part.name());
            }
            FeederPart::Behind(part) => {
                return page::of_group(page::conductors_behind(), part.name());
            }
            FeederPart::ReactorEntered(part) => {
                return page::of_group(page::reactor_entered(), part.name());
            }
            FeederPart::ReactorAdvised(part) => {
                return page::of_group(page::reactor_advised(), part.name());
            }
            plain => plain.plain_name(),
        };
        plain.to_owned()
    }

    const fn plain_name(self) -> &'static str {
        match self {
            FeederPart::MotorCurrent => page::motor_full_load_current(),
            FeederPart::DriveInput => page::drive_input_current(),
            FeederPart::Ahead(part) | FeederPart::Behind(part) => part.name(),
            FeederPart::ReactorEntered(part) | FeederPart::ReactorAdvised(part) => part.name(),
            FeederPart::DropRatio => page::drop_of_both(),
            FeederPart::DeviceProduct => page::device_product(),
            FeederPart::DeviceLargest => page::device_largest(),
            FeederPart::DeviceRating => page::branch_device(),
            FeederPart::Disconnect => page::disconnect(),
            FeederPart::SourceRatio => page::source_ratio(),
            FeederPart::SourceImpedance => page::source_impedance(),
            FeederPart::DriveLoss => page::drive_loss(),
            FeederPart::DriveInside => page::drive_inside(),
            FeederPart::ReactorHeat => page::reactor_heat(),
            FeederPart::DeviceHeat => page::device_heat(),
            FeederPart::ConductorHeat => page::conductor_heat(),
            FeederPart::Heat => page::feeder_heat(),
        }
    }

    /// Every figure of a feeder, in the order of the sheet.
    pub(super) fn all() -> Vec<FeederPart> {
        use FeederPart as F;
        let mut all = vec![F::MotorCurrent, F::DriveInput];
        all.extend(RunPart::ALL.map(F::Ahead));
        all.extend([F::DeviceProduct, F::DeviceLargest, F::DeviceRating]);
        all.extend([F::Disconnect, F::SourceRatio, F::SourceImpedance]);
        all.extend(ReactorPart::ALL.map(F::ReactorEntered));
        all.extend(ReactorPart::ALL.map(F::ReactorAdvised));
        all.extend(RunPart::ALL.map(F::Behind));
        all.extend([F::DropRatio, F::DriveLoss, F::DriveInside, F::ReactorHeat]);
        all.extend([F::DeviceHeat, F::ConductorHeat, F::Heat]);
        all
    }
}

impl PanelPart {
    fn traced(self, sheet: &Worked) -> Option<Traced> {
        let incoming = &sheet.incoming;
        let fault = &sheet.fault;
        let main = || -> Option<&MainDevice> { incoming.main.as_ref() };
        let figure = match self {
            PanelPart::Incoming(part) => return part.traced(incoming.conductors.as_ref()?),
            PanelPart::MainRating => return given(main()?.rating.as_ref()),
            PanelPart::AtSource => return given(fault.at_source.as_ref()),
            PanelPart::AtPanel => return given(fault.at_panel.as_ref()),
            PanelPart::Running => incoming.running.as_ref(),
            PanelPart::Connected => incoming.connected.as_ref(),
            PanelPart::RequiredConnected => incoming.required_connected.as_ref(),
            PanelPart::MainSum => Some(&main()?.sum),
            PanelPart::MainSumByInputs => Some(&main()?.sum_by_inputs),
            PanelPart::MainLargest => main()?.largest.as_ref(),
            PanelPart::TransformerCurrent => fault.transformer_current.as_ref(),
            PanelPart::RunFactor => fault.run_factor.as_ref(),
            PanelPart::Multiplier => fault.multiplier.as_ref(),
        };
        trace(figure)
    }

    pub(super) fn name(self) -> String {
        let plain = match self {
            PanelPart::Incoming(part) => {
                return page::of_group(page::conductors_incoming(), part.name());
            }
            PanelPart::Running => page::running_current(),
            PanelPart::Connected => page::connected_current(),
            PanelPart::RequiredConnected => page::required_connected(),
            PanelPart::MainSum => page::main_sum(),
            PanelPart::MainSumByInputs => page::main_sum_by_inputs(),
            PanelPart::MainLargest => page::main_largest(),
            PanelPart::MainRating => page::main_device(),
            PanelPart::TransformerCurrent => page::transformer_current(),
            PanelPart::AtSource => page::fault_at_source(),
            PanelPart::RunFactor => page::run_factor(),
            PanelPart::Multiplier => page::multiplier(),
            PanelPart::AtPanel => page::fault_at_panel(),
        };
        plain.to_owned()
    }

    /// Every figure of the panel, in the order of the sheet.
    pub(super) fn all() -> Vec<PanelPart> {
        use PanelPart as P;
        let mut all = vec![P::Running, P::Connected];
        all.extend(RunPart::ALL.map(P::Incoming));
        all.extend([P::RequiredConnected, P::MainSum, P::MainSumByInputs]);
        all.extend([P::MainLargest, P::MainRating, P::TransformerCurrent]);
        all.extend([P::AtSource, P::RunFactor, P::Multiplier, P::AtPanel]);
        all
    }
}

impl AirPart {
    pub(super) const ALL: [AirPart; 11] = [
        AirPart::Surface,
        AirPart::Conductance,
        AirPart::SealedRise,
        AirPart::SealedInside,
        AirPart::Inside,
        AirPart::Pressure,
        AirPart::Density,
        AirPart::Airflow,
        AirPart::AirflowCredited,
        AirPart::AirflowMetricRule,
        AirPart::AirflowUsRule,
    ];

    fn traced(self, air: &Air) -> Option<Traced> {
        let figure = match self {
            AirPart::Inside => return given(air.inside.as_ref()),
            AirPart::Surface => air.surface.as_ref(),
            AirPart::Conductance => air.conductance.as_ref(),
            AirPart::SealedRise => air.sealed_rise.as_ref(),
            AirPart::SealedInside => air.sealed_inside.as_ref(),
            AirPart::Pressure => air.pressure.as_ref(),
            AirPart::Density => air.density.as_ref(),
            AirPart::Airflow => air.airflow.as_ref(),
            AirPart::AirflowCredited => air.airflow_credited.as_ref(),
            AirPart::AirflowMetricRule => air.airflow_metric_rule.as_ref(),
            AirPart::AirflowUsRule => air.airflow_us_rule.as_ref(),
        };
        trace(figure)
    }

    /// Whether it is about the air which fans move.
    const fn is_of_fans(self) -> bool {
        matches!(
            self,
            AirPart::Pressure
                | AirPart::Density
                | AirPart::Airflow
                | AirPart::AirflowCredited
                | AirPart::AirflowMetricRule
                | AirPart::AirflowUsRule
        )
    }

    pub(super) const fn name(self) -> &'static str {
        match self {
            AirPart::Surface => page::surface(),
            AirPart::Conductance => page::conductance(),
            AirPart::SealedRise => page::sealed_rise(),
            AirPart::SealedInside => page::sealed_inside(),
            AirPart::Inside => page::air_inside(),
            AirPart::Pressure => page::site_pressure(),
            AirPart::Density => page::air_density(),
            AirPart::Airflow => page::airflow(),
            AirPart::AirflowCredited => page::airflow_credited(),
            AirPart::AirflowMetricRule => page::airflow_metric_rule(),
            AirPart::AirflowUsRule => page::airflow_us_rule(),
        }
    }
}

/// The worked feeder with this identity.
pub(super) fn feeder(sheet: &Worked, id: HolderId) -> Option<&Arc<WorkedFeeder>> {
    sheet.feeders.iter().find(|feeder| feeder.id == id)
}

/// The run of a feeder.
pub(super) fn run_of(feeder: &WorkedFeeder, run: Run) -> Option<&Conductors> {
    match run {
        Run::Ahead => feeder.ahead.as_ref(),
        Run::Behind => feeder.behind.as_ref(),
        Run::Incoming => None,
    }
}

fn air(sheet: &Worked, load: Load) -> &Air {
    match load {
        Load::Running => &sheet.enclosure.air,
        Load::Connected => &sheet.enclosure.air_connected,
    }
}

fn trace(figure: Option<&Arc<Figure>>) -> Option<Traced> {
    figure.map(|figure| Traced {
        amount: figure.value,
        origin: Origin::Figure(Arc::clone(figure)),
    })
}

fn given<T: Copy + Into<Amount>>(value: Option<&Given<T>>) -> Option<Traced> {
    value.map(|value| Traced {
        amount: value.value.into(),
        origin: value.origin.clone(),
    })
}
