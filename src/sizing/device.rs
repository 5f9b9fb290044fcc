//! The branch protective device ahead of a drive.

use crate::math::{agree, reaches};
use crate::physics::circuit::share_of;
use crate::quantity::{Current, Ratio};
use crate::sizing::rules;
use crate::tables::nec_motors::largest_ratio;
use crate::tables::nec_ratings::{LARGEST_CLASS_CC, at_or_above, at_or_below, is_standard};
use crate::tables::{DeviceType, Edition};
use crate::working::{Field, Figure, Given, Grade, MarginNote, NoteKind, Term};
use std::collections::BTreeSet;
use std::sync::Arc;

/// What a branch device is sized from.
#[derive(Debug, Clone, PartialEq)]
pub struct DeviceInput {
    /// Type of the device.
    pub device: Given<DeviceType>,
    /// Motor full-load current.
    pub motor_current: Given<Current>,
    /// The drive's rated input current.
    pub drive_input: Option<Given<Current>>,
    /// Types which the drive's instructions permit, where entered.
    pub permitted: Option<BTreeSet<DeviceType>>,
    /// Largest rating which the drive's instructions permit, where entered.
    pub largest: Option<Given<Current>>,
    /// Rating to be installed, where entered.
    pub rating: Option<Given<Current>>,
}

/// A branch device, worked.
#[derive(Debug, Clone, PartialEq)]
pub struct Device {
    /// Its type.
    pub device: Given<DeviceType>,
    /// Percentage of the table times motor current.
    pub product: Arc<Figure>,
    /// The largest rating which rule and drive permit; `None` where no rating is right.
    pub largest: Option<Arc<Figure>>,
    /// The installed rating: as entered, or the largest permitted.
    pub rating: Option<Given<Current>>,
}

/// Sizes the branch device of a drive.
///
/// Percentage of the table times motor current, next standard rating up, never above what the drive's instructions
/// permit and only of a type which they list. Source: NEC 2023, 430.52(C)(1), 430.52(C)(2), 430.130(A), 240.6(A).
pub fn size_branch_device(
    input: &DeviceInput,
    edition: Edition,
    notes: &mut Vec<MarginNote>,
) -> Device {
    let product = product(input.device.value, &input.motor_current);
    let largest = largest_permitted(input, &product, edition, notes);
    let rating = installed(input, largest.as_ref(), edition, notes);
    if let (Some(rating), Some(drive_input)) = (&rating, &input.drive_input)
        && !reaches(rating.value.to_amperes(), drive_input.value.to_amperes())
    {
        notes.push(MarginNote::new(
            Grade::Query,
            Field::DeviceRating,
            NoteKind::DeviceBelowInput {
                rating: rating.value,
                input: drive_input.value,
            },
        ));
    }
    Device {
        device: input.device.clone(),
        product,
        largest,
        rating,
    }
}

/// The percentage of Table 430.52(C)(1) times motor full-load current.
fn product(device: DeviceType, motor_current: &Given<Current>) -> Arc<Figure> {
    let percentage = largest_ratio(device);
    let column = match device {
        DeviceType::TimeDelayFuse => &rules::TIME_DELAY_PERCENTAGE,
        DeviceType::NontimeDelayFuse | DeviceType::ClassCcFuse => &rules::NONTIME_DELAY_PERCENTAGE,
        DeviceType::InverseTimeBreaker => &rules::BREAKER_PERCENTAGE,
    };
    let percentage_figure = Arc::new(column.figure(percentage, Vec::new()));
    Arc::new(rules::DEVICE_PRODUCT.figure(
        share_of(percentage, motor_current.value),
        [Term::of("p", &percentage_figure), motor_current.term("I_m")],
    ))
}

fn largest_permitted(
    input: &DeviceInput,
    product: &Arc<Figure>,
    edition: Edition,
    notes: &mut Vec<MarginNote>,
) -> Option<Arc<Figure>> {
    let (by_rule, by_rule_figure) = standard_rating(input.device.value, product, edition, notes)?;
    if input
        .permitted
        .as_ref()
        .is_some_and(|permitted| !permitted.contains(&input.device.value))
    {
        notes.push(
            MarginNote::new(
                Grade::Stop,
                Field::DeviceType,
                NoteKind::DeviceTypeNotPermitted { by_rule },
            )
            .about(&by_rule_figure),
        );
        return None;
    }
    let (rating, figure) = held_by_drive(input, by_rule, by_rule_figure, edition, notes)?;
    if input.device.value == DeviceType::ClassCcFuse {
        return held_by_class_cc(input, product, (rating, figure), notes);
    }
    Some(figure)
}

/// The ratings by which a type is sized: Class CC fuses go by those of nontime-delay fuses, and where the class ends is
/// worked afterwards.
fn rating_list(device: DeviceType) -> DeviceType {
    match device {
        DeviceType::ClassCcFuse => DeviceType::NontimeDelayFuse,
        other => other,
    }
}

/// The product where it is a standard rating, else the next one up.
fn standard_rating(
    device: DeviceType,
    product: &Arc<Figure>,
    edition: Edition,
    notes: &mut Vec<MarginNote>,
) -> Option<(Current, Arc<Figure>)> {
    let amperes: Current = product.quantity()?;
    let Some(rating) = at_or_above(amperes, rating_list(device), edition) else {
        notes.push(
            MarginNote::new(
                Grade::Stop,
                Field::DeviceType,
                NoteKind::DeviceBeyondTable { product: amperes },
            )
            .about(product),
        );
        return None;
    };
    let figure = rules::DEVICE_STANDARD.figure(rating, [Term::of("I_d", product)]);
    Some((rating, Arc::new(figure)))
}

fn held_by_drive(
    input: &DeviceInput,
    by_rule: Current,
    by_rule_figure: Arc<Figure>,
    edition: Edition,
    notes: &mut Vec<MarginNote>,
) -> Option<(Current, Arc<Figure>)> {
    let Some(limit) = &input.largest else {
        return Some((by_rule, by_rule_figure));
    };
    if reaches(limit.value.to_amperes(), by_rule.to_amperes()) {
        return Some((by_rule, by_rule_figure));
    }
    let Some(taken) = at_or_below(limit.value, rating_list(input.device.value), edition) else {
        notes.push(MarginNote::new(
            Grade::Stop,
            Field::LargestPermitted,
            NoteKind::LimitBelowStandard { limit: limit.value },
        ));
        return None;
    };
    let kind = if agree(taken.to_amperes(), limit.value.to_amperes()) {
        NoteKind::DeviceHeldByDrive { by_rule, taken }
    } else {
        NoteKind::LimitNotStandard {
            limit: limit.value,
            taken,
        }
    };
    notes.push(MarginNote::new(Grade::Note, Field::LargestPermitted, kind));
    let figure = rules::DEVICE_DRIVE_LIMIT.figure(
        taken,
        [
            Term::of("by rule", &by_rule_figure),
            limit.term("drive's largest"),
        ],
    );
    Some((taken, Arc::new(figure)))
}

/// Class CC ends at 30 A: enough only where that is not below 125 per cent of the larger of motor and drive current.
fn held_by_class_cc(
    input: &DeviceInput,
    product: &Arc<Figure>,
    (rating, figure): (Current, Arc<Figure>),
    notes: &mut Vec<MarginNote>,
) -> Option<Arc<Figure>> {
    if reaches(LARGEST_CLASS_CC.to_amperes(), rating.to_amperes()) {
        return Some(figure);
    }
    let motor = input.motor_current.value;
    let larger = match &input.drive_input {
        Some(drive) if drive.value > motor => drive.value,
        _ => motor,
    };
    let needed = 1.25 * larger;
    let field = Field::DeviceType;
    if !reaches(LARGEST_CLASS_CC.to_amperes(), needed.to_amperes()) {
        notes.push(
            MarginNote::new(Grade::Stop, field, NoteKind::ClassCcTooSmall { needed })
                .about(product),
        );
        return None;
    }
    notes.push(MarginNote::new(
        Grade::Note,
        field,
        NoteKind::ClassCcEnds {
            by_rule: rating,
            taken: LARGEST_CLASS_CC,
        },
    ));
    Some(Arc::new(rules::DEVICE_CLASS_CC.figure(
        LARGEST_CLASS_CC,
        [
            Term::of("I_n", &figure),
            Term::constant("class ends at", LARGEST_CLASS_CC),
            Term::constant("at least", needed),
        ],
    )))
}

fn installed(
    input: &DeviceInput,
    largest: Option<&Arc<Figure>>,
    edition: Edition,
    notes: &mut Vec<MarginNote>,
) -> Option<Given<Current>> {
    let Some(entered) = &input.rating else {
        return largest.and_then(Given::from_figure);
    };
    let field = Field::DeviceRating;
    if !is_standard(entered.value, rating_list(input.device.value), edition) {
        notes.push(MarginNote::new(
            Grade::Query,
            field,
            NoteKind::DeviceNotStandard {
                entered: entered.value,
            },
        ));
    }
    if let Some(figure) = largest
        && let Some(most) = figure.quantity::<Current>()
        && !reaches(most.to_amperes(), entered.value.to_amperes())
    {
        notes.push(
            MarginNote::new(
                Grade::Stop,
                field,
                NoteKind::DeviceAboveMaximum {
                    entered: entered.value,
                    largest: most,
                },
            )
            .about(figure),
        );
    }
    Some(entered.clone())
}

/// The branch device worked again for the type of the main device, under the drive's own limit: what a main device of
/// that type may count. A smaller rating which is entered for the branch counts as it is, the cautious reading of "the
/// device provided". Source: NEC 2023, 430.62(A), 409.21(C).
pub fn branch_for_main(
    main: DeviceType,
    branch: &DeviceInput,
    edition: Edition,
) -> Option<(Current, Arc<Figure>)> {
    // Its findings belong to the branch, where they are made already.
    let mut unheard = Vec::new();
    let product = product(main, &branch.motor_current);
    let (by_rule, figure) = standard_rating(main, &product, edition, &mut unheard)?;
    let as_main = DeviceInput {
        device: Given {
            value: main,
            ..branch.device.clone()
        },
        ..branch.clone()
    };
    let (permitted, figure) = held_by_drive(&as_main, by_rule, figure, edition, &mut unheard)?;
    let Some(entered) = branch
        .rating
        .as_ref()
        .filter(|entered| entered.value < permitted)
    else {
        return Some((permitted, figure));
    };
    let provided = rules::BRANCH_PROVIDED.figure(
        entered.value,
        [entered.term("I_n"), Term::of("permitted", &figure)],
    );
    Some((entered.value, Arc::new(provided)))
}

/// Smallest rating of the disconnect of a drive: 115 per cent of its rated input current.
///
/// Source: NEC 2023, 430.128 (from memory).
pub fn disconnect(drive_input: &Given<Current>) -> Arc<Figure> {
    let rating = share_of(Ratio::of_one(1.15), drive_input.value);
    Arc::new(rules::DISCONNECT.figure(rating, [drive_input.term("I_in")]))
}
