//! Every other text of the page and of the printed summary: headings, buttons, help, status, files, keys.
//!
//! Here: fixed texts, one line each in `texts!`, and the few which carry a value. Not here: names of fields and
//! choices, findings, refusals. To add a text, add a line `name = "text";` to the group it belongs to.

use super::labels::{label, lower_first};
use super::numbers::counted;
use crate::sheet::Edit;
use crate::working::{Holder, HolderId, Place};

macro_rules! texts {
    ($($name:ident = $text:expr;)+) => {
        $(
            #[doc = $text]
            pub const fn $name() -> &'static str {
                $text
            }
        )+
        /// Every fixed text with its name, for the tests.
        pub const ALL: &[(&str, &str)] = &[$((stringify!($name), $text)),+];
    };
}

texts! {
    // The program.
    program = "Ventrail";
    skip_to_sheet = "Skip to the sheet";

    // The bar at the head of the window.
    bar_label = "Sheet and files";
    files_label = "Files and print";
    new_sheet = "New sheet";
    demo_sheet = "Demo";
    open_file = "Open file";
    save_file = "Save file";
    print = "Print";
    undo = "Undo";
    redo = "Redo";
    nothing_to_undo = "Nothing to undo";
    nothing_to_redo = "Nothing to redo";
    keys_button = "Keys";
    close = "Close";

    // The sheet and its parts.
    untitled = "Untitled sheet";
    the_panel = "Panel";
    a_row = "a row";
    heading_title = "Title block";
    heading_supply = "Supply";
    heading_feeders = "Feeders";
    heading_incoming = "Incoming circuit";
    heading_enclosure = "Enclosure and air";
    heading_ledger = "Heat ledger";
    heading_sources = "Other sources of heat";
    heading_margin = "Margin";
    heading_totals = "Totals";
    heading_notes = "Margin notes";
    heading_working = "Working";
    heading_summary = "Summary";
    heading_assumptions = "Assumed until somebody types it";
    heading_cautions = "Cautions";
    heading_protection = "Protection and conductors";
    heading_reactors = "Input reactors and heat";
    heading_air = "Temperature and air";

    // The empty sheet.
    empty_sheet = "List the motors of one panel, each on its own drive, with its supply and its enclosure: Ventrail sizes conductors, devices and reactors, adds up the heat, and shows how each figure came about.";
    demo_brine_hall = "Demo: brine hall, 11 feeders, filter fans";
    demo_outdoor = "Demo: sealed panel outdoors at 1,900 m";
    no_feeders = "No feeders yet.";
    no_sources = "No other sources of heat yet.";
    no_notes = "Nothing to note.";
    no_assumptions = "Nothing is assumed: every value was entered or worked out.";

    // The three inks.
    ink_key_entered = "entered by you";
    ink_key_assumed = "assumed until you type it";
    ink_key_worked = "worked out";
    ink_key_label = "How values are marked";

    // Sentences which open as lists.
    sentence_open = "Fill in";
    sentence_close = "Done";
    typed_not_taken = "It was typed, but not yet taken. Press Enter in it to take it.";
    choose_none = "not entered";
    refused_label = "Not taken";

    // Feeders.
    add_feeder = "Add feeder";
    duplicate_feeder = "Duplicate";
    delete_feeder = "Delete";
    move_up = "Move up";
    move_down = "Move down";
    feeder_commands = "The feeder with the cursor";
    feeder_before = "Feeder before";
    feeder_after = "Feeder after";
    feeder_form_open = "All fields of this feeder";
    group_driven = "What is driven";
    group_ahead = "Ahead of the drive";
    group_behind = "Behind the drive";
    group_enclosure = "In the enclosure";
    group_drive = "Drive, by its data sheet";
    group_device = "Device and short circuit";
    group_reactor = "Input reactor";
    group_remarks = "Remarks";
    head_drop = "Drop";
    head_heat = "Heat";
    head_device = "Device";
    head_conductors = "Conductors";
    head_reactor = "Reactor";
    head_margin = "Margin";
    head_disconnect = "Disconnect";
    head_running = "running together";
    head_connected = "connected";
    head_total = "Total";
    head_share = "Share of the whole";
    head_limit = "Limit";
    head_verdict = "Verdict";
    head_ground = "Ground";
    head_of = "For";
    head_field = "Field";
    head_value = "Value";
    head_reason = "Reason";
    unit_reactor = "mH";
    unit_drop = "%";
    unit_heat = "W";
    none_fits = "none fits";
    grid_label = "Feeders, one in each row";
    grid_help = "Arrow keys move, typing replaces, Enter or F2 edits, Escape gives up the edit.";

    // Other sources of heat.
    add_source = "Add source";
    source_added = "Source of heat added.";

    // Worked values.
    ledger_label = "Heat ledger, watts";
    ledger_advised = "Advised reactors, not entered: beside the total";
    conductors_ahead = "Conductors ahead of the drive";
    conductors_behind = "Conductors behind the drive";
    conductors_incoming = "Incoming conductors";
    size = "Size";
    required_ampacity = "Ampacity required";
    required_connected = "Ampacity required for everything connected";
    usable_ampacity = "Ampacity of the size";
    grounding_conductor = "Equipment grounding conductor";
    branch_device = "Branch device";
    main_device = "Main device";
    disconnect = "Disconnect, at least";
    voltage_drop = "Voltage drop";
    voltage_drop_share = "Voltage drop, share of the supply";
    drop_of_both = "Voltage drop of both runs";
    heat_of_run = "Heat inside";
    motor_full_load_current = "Motor full-load current";
    drive_input_current = "Drive rated input current";
    device_product = "Motor current by the percentage";
    device_largest = "Largest device permitted";
    source_ratio = "Source power by drive power";
    source_impedance = "Source impedance on the drive's base";
    reactor_entered = "Reactor entered";
    reactor_advised = "Reactor advised";
    reactor_none = "none";
    reactor_open = "open";
    inductance = "Inductance of each phase";
    reactor_rated_current = "Rated current, at least";
    reactor_heat = "Heat of the reactor";
    drive_loss = "Loss of the drive";
    drive_inside = "Loss of the drive, inside";
    device_heat = "Heat of the device";
    conductor_heat = "Heat of conductors inside";
    feeder_heat = "Heat of the feeder, inside";
    running_current = "Running current";
    connected_current = "Connected current";
    main_sum = "Sum for the main device";
    main_sum_by_inputs = "The same sum by drive input currents";
    main_largest = "Largest main device permitted";
    transformer_current = "Transformer full-load current";
    run_factor = "Factor f of the incoming run";
    multiplier = "Multiplier M of the incoming run";
    fault_at_source = "Fault current at the start of the incoming run";
    fault_at_panel = "Fault current at the panel";
    surface = "Effective surface";
    conductance = "Heat through the walls";
    sealed_rise = "Temperature rise when sealed";
    air_inside = "Air inside, as the sheet goes by";
    sealed_inside = "Air inside when sealed";
    air_density = "Density of the inlet air";
    site_pressure = "Air pressure of the site";
    airflow = "Airflow, no credit for the walls";
    airflow_credited = "Airflow, with credit for the walls";
    airflow_metric_rule = "Airflow by the metric trade rule";
    airflow_us_rule = "Airflow by the US trade rule";
    not_worked = "not worked";
    cannot_be_worked = "Something is missing: see the margin notes.";

    // The margin.
    margin_label = "Totals and margin notes";
    notes_label = "Margin notes, stops first";
    go_to_subject = "Go to it";
    answer = "Answer";
    answer_placeholder = "Your answer, for the reviewer";
    next_note = "Next note";

    // The working strip.
    strip_label = "Working of the figure under the cursor";
    strip_empty = "Move to a worked figure to read its working here.";
    strip_entered = "You entered this value.";
    strip_pin = "Pin this working";
    strip_unpin = "Follow the cursor again";
    strip_whole = "Whole chain";
    strip_short = "First step only";
    key_space = "Space";

    // Cautions.
    caution_label = "Caution";
    caution_open = "Read all cautions";
    caution_shrink = "Show one line only";

    // Where the sheet is kept.
    kept_aside = "Kept beside the other tab's sheet until you choose";
    not_kept_here = "Not kept in this browser";
    not_in_file = "Not yet in a file";
    store_full = "This browser's store is full. The sheet is safe on this page; save it as a file now.";
    store_missing = "This browser keeps nothing for this page, perhaps because it is a private window. Save the sheet as a file before you close it.";
    store_unreadable = "What this browser kept of the last sheet could not be read. It is kept as it is; you can save it as a file and look at it.";
    save_kept_text = "Save what was kept as a file";
    rescued_earlier = "A sheet which could not be opened earlier is still kept in this browser.";
    rescued_replaced = "A sheet which you replaced by another one is in no file, and is still kept in this browser.";
    rescued_aside = "A sheet which was worked on while another tab had changed it is still kept in this browser, beside the other tab's.";
    rescued_drop = "I do not need it any more";
    other_tab = "This sheet was changed in another tab. Nothing is lost: choose which of the two to go on with.";
    other_tab_take = "Take the other tab's sheet";
    other_tab_keep = "Keep this one";
    other_tab_taken = "The other tab's sheet is open here now. Undo brings this tab's back.";
    other_tab_name = "the other tab's sheet";

    // Files.
    file_refused_title = "The file was not opened";
    file_refused_kept = "The sheet you had open is unchanged.";
    file_unreadable = "The browser could not read the file. It may have been moved, or be in use elsewhere.";
    file_too_large = "The file is too large to be a sheet.";
    save_failed_title = "The file was not saved.";
    save_failed = "The browser could not write it. The sheet is still on this page; try another place or name.";
    sheet_replaced = "An empty sheet is open. Undo brings the former one back.";
    default_file_name = "ventrail-sheet";
    rescued_file_name = "ventrail-rescued.json";

    // The printed summary.
    print_title = "Panel heat and protection summary";
    print_version = "Ventrail version";
    print_planning = "Planning figures, not an approval";
    print_run_ahead = "Run ahead";
    print_run_behind = "Run behind";
    print_conditions = "Conditions";
    print_review = "Review";
    print_prepared_by = "Prepared by";
    print_reviewed_by = "Reviewed by";
    print_signature = "Signature";
    print_licence = "Licence number";
    print_date = "Date";
    print_remarks = "Reviewer's remarks";
    print_inks = "Marks: e entered, a assumed, no mark worked out";
    print_mark_entered = "e";
    print_mark_assumed = "a";
    print_answer = "Answer:";
    print_no_answer = "No answer yet.";
    print_workings = "Workings";
    print_entered = "Further values, as entered";
    print_steps_once = "A step which several parts have in common is printed once, where it comes up first.";
    print_sources = "Sources";
    print_page_numbers = "Some browsers number the pages only when headers and footers are switched on in the print window.";
    print_end = "End of the summary";

    // When the program stops.
    stopped_twice = "Ventrail stopped twice while opening the last sheet, so it has opened an empty one. The last sheet is kept: save it as a file.";

    // The list of keys.
    keys_title = "Keys";
    keys_where_grid = "In the feeder list";
    keys_where_page = "Everywhere";
}

/// What the keys do in the feeder list: keys, what they do.
pub const fn grid_keys() -> &'static [(&'static str, &'static str)] {
    &[
        ("Arrow keys", "move to the next cell"),
        ("Page Up, Page Down", "move ten rows up, ten rows down"),
        ("Tab, Shift+Tab", "leave the list"),
        (
            "Enter, F2",
            "edit the cell; Enter again takes the value and moves down",
        ),
        (
            "Tab, Shift+Tab in an edit",
            "take the value and go to the next cell, to the one before",
        ),
        ("Escape", "give up the edit, the old value stays"),
        ("typing", "replace the value"),
        ("Delete, Backspace", "empty the cell"),
        ("Space", "show the working of the figure in the strip below"),
        ("Home, End", "first cell, last cell of the row"),
        ("Ctrl+Home, Ctrl+End", "first row, last row"),
        ("Alt+Up, Alt+Down", "move the feeder up, down"),
        ("Ctrl+Enter", "add a feeder below"),
        ("Ctrl+Shift+Enter", "duplicate the feeder"),
        ("Ctrl+Delete", "delete the feeder"),
        ("Alt+Enter", "open all fields of the feeder"),
    ]
}

/// What the keys do everywhere on the page: keys, what they do.
pub const fn page_keys() -> &'static [(&'static str, &'static str)] {
    &[
        ("Ctrl+Z", "undo"),
        ("Ctrl+Y, Ctrl+Shift+Z", "redo"),
        ("Ctrl+S", "save the sheet as a file"),
        ("Ctrl+O", "open a file"),
        ("Ctrl+P", "print the summary"),
        ("F8, Shift+F8", "next margin note; back to the one before"),
        (
            "P",
            "on a worked figure or in the strip below: pin the working there, or let it go",
        ),
    ]
}

/// How many findings there are of each grade: `1 stop, 3 queries, 1 note`.
pub fn grade_counts(stops: usize, queries: usize, notes: usize) -> String {
    let parts: Vec<String> = [
        (stops, "stop", "stops"),
        (queries, "query", "queries"),
        (notes, "note", "notes"),
    ]
    .into_iter()
    .filter(|(count, _, _)| *count > 0)
    .map(|(count, one, many)| number_of(count, one, many))
    .collect();
    if parts.is_empty() {
        no_notes().to_owned()
    } else {
        parts.join(", ")
    }
}

/// How many feeders there are and which of them stand by: `11 feeders, 9 run together (P-403 and F-433 stand by)`.
pub fn feeder_counts(feeders: usize, standing_by: &[String]) -> String {
    let all = number_of(feeders, "feeder", "feeders");
    match standing_by {
        [] => all,
        [one] => format!(
            "{all}, {} run together ({one} stands by)",
            feeders.saturating_sub(1)
        ),
        many => format!(
            "{all}, {} run together ({} stand by)",
            feeders.saturating_sub(many.len()),
            listed(many)
        ),
    }
}

/// How much is assumed.
pub fn assumption_count(count: usize) -> String {
    number_of(count, "value", "values")
}

/// Words in a row: `a`, `a and b`, `a, b and c`.
pub fn listed(words: &[String]) -> String {
    match words {
        [] => String::new(),
        [one] => one.clone(),
        [rest @ .., last] => format!("{} and {last}", rest.join(", ")),
    }
}

/// Kept in the browser's store at a time of day.
pub fn saved_here_at(time: &str) -> String {
    format!("Saved in this browser at {time}")
}

/// In a file of this name, unchanged since.
pub fn in_file(name: &str) -> String {
    format!("In the file {name}")
}

/// Changed since it was saved as a file of this name.
pub fn changed_since(name: &str) -> String {
    format!("Changed since it was saved as {name}")
}

/// Handed to the browser under a name.
pub fn file_saved_as(name: &str) -> String {
    format!("Handed to the browser as {name}")
}

/// A file of this name is open.
pub fn file_opened_as(name: &str) -> String {
    format!("{name} is open.")
}

/// The button which takes back an edit of this name.
pub fn undo_named(edit: &str) -> String {
    format!("Undo: {edit}")
}

/// The button which does an edit of this name again.
pub fn redo_named(edit: &str) -> String {
    format!("Redo: {edit}")
}

/// A feeder without a tag, by its row, counted from one.
pub fn untagged_feeder(row: usize) -> String {
    format!("feeder in row {row}")
}

/// A source of heat without a name, by its row, counted from one.
pub fn unnamed_source(row: usize) -> String {
    format!("source of heat in row {row}")
}

/// Something of a feeder: `P-402, branch device`.
pub fn of_feeder(tag: &str, what: &str) -> String {
    format!("{tag}, {}", lower_first(what))
}

/// Something within a group: `Conductors ahead of the drive, ampacity of the size`.
pub fn of_group(group: &str, what: &str) -> String {
    format!("{group}, {}", lower_first(what))
}

/// A reactor of a percentage with its inductance, whose unit stands in the head.
pub fn reactor_of(percent: &str, inductance: &str) -> String {
    format!("{percent}, {inductance}")
}

/// A reactor which is advised, not entered.
pub fn reactor_only_advised(percent: &str) -> String {
    format!("({percent} advised)")
}

/// A value which counts in the connected total only.
pub fn standing_by_value(value: &str) -> String {
    format!("({value})")
}

/// The limit of a total: `limit 45 °C`.
pub fn limit_of(limit: &str, value: &str) -> String {
    format!("{limit} {value}")
}

/// Why a value is assumed.
pub fn assumed_because(reason: &str) -> String {
    format!("assumed: {reason}")
}

/// The first answer of a list while another one is assumed.
pub fn assumed_option(answer: &str) -> String {
    format!("{answer} (assumed)")
}

/// What a field takes.
pub fn accepts(range: &str) -> String {
    format!("Takes {range}.")
}

/// The text as it was typed, where it is shown in other units.
pub fn typed_as(text: String) -> String {
    format!("Typed as {text}.")
}

/// What still counts while a typed text is refused.
pub fn still_counts(value: &str) -> String {
    format!("{value} still counts.")
}

/// Said aloud when a typed text was refused.
pub fn refused(field: &str, why: &str) -> String {
    format!("{field}: not taken. {why}")
}

/// Said aloud when a field was emptied.
pub fn emptied(field: &str) -> String {
    format!("{field} emptied")
}

/// Said aloud after undo.
pub fn undone(edit: &str) -> String {
    format!("Undone: {edit}")
}

/// Said aloud after redo.
pub fn redone(edit: &str) -> String {
    format!("Done again: {edit}")
}

/// Said aloud when a feeder was added.
pub fn feeder_added(row: usize) -> String {
    format!("Feeder added in row {row}")
}

/// Said aloud when a feeder was duplicated.
pub fn feeder_duplicated(tag: &str) -> String {
    format!("{tag} duplicated; the copy wants a tag of its own")
}

/// Said aloud when a feeder was deleted.
pub fn feeder_deleted(tag: &str) -> String {
    format!("{tag} deleted; undo brings it back")
}

/// Said aloud when a feeder was moved.
pub fn feeder_moved(tag: &str, row: usize) -> String {
    format!("{tag} is in row {row} now")
}

/// Said aloud when a source of heat was deleted.
pub fn source_deleted(name: &str) -> String {
    format!("{name} deleted; undo brings it back")
}

/// The heading of the form of one feeder.
pub fn feeder_form_of(tag: &str) -> String {
    format!("Feeder {tag} in full")
}

/// The head of a printed page: sheet, issue, date.
pub fn print_head(sheet: &str, issue: &str, date: &str) -> String {
    let mut parts = vec![sheet.to_owned()];
    if !issue.is_empty() {
        parts.push(format!("issue {issue}"));
    }
    if !date.is_empty() {
        parts.push(date.to_owned());
    }
    parts.join(", ")
}

/// What an edit does, to name its undo: `drive input of P-402`. `tag` gives the name of a feeder or of a source of heat.
pub fn edit_name(edit: &Edit, tag: impl Fn(HolderId) -> String) -> String {
    let at = |place: &Place| {
        let field = lower_first(label(place.field));
        match place.holder {
            Holder::Sheet => field,
            Holder::Feeder(id) | Holder::Source(id) => format!("{field} of {}", tag(id)),
        }
    };
    match edit {
        Edit::Set(place, _) => at(place),
        Edit::Clear(place) => format!("empty {}", at(place)),
        Edit::Refuse(place, _) => format!("refused text in {}", at(place)),
        Edit::AddFeeder { .. } => "add a feeder".to_owned(),
        Edit::DuplicateFeeder(id) => format!("duplicate {}", tag(*id)),
        Edit::DeleteFeeder(id) => format!("delete {}", tag(*id)),
        Edit::MoveFeeder { id, up: true } => format!("move {} up", tag(*id)),
        Edit::MoveFeeder { id, up: false } => format!("move {} down", tag(*id)),
        Edit::AddSource => "add a source of heat".to_owned(),
        Edit::DeleteSource(id) => format!("delete {}", tag(*id)),
        Edit::Answer(note, _) => format!("answer about {}", at(&note.place)),
        Edit::Replace(_) => "open another sheet".to_owned(),
    }
}

/// What the page says aloud after an edit has changed the findings.
pub fn announced(counts: &str) -> String {
    format!("Worked out: {counts}")
}

/// `singular` for one, `plural` for any other number, after the number itself.
fn number_of(count: usize, singular: &str, plural: &str) -> String {
    if count == 1 {
        format!("1 {singular}")
    } else {
        format!("{} {plural}", counted(count))
    }
}
