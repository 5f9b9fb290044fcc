//! Markup in one type: elements whose attributes and children are held in lists.
//!
//! A view in which each element has a type of its own makes the program half as large again, since each type is
//! compiled apart. Here an element is data, so the code which builds and updates it exists once; what follows its signals
//! is an effect as in any other view. Start with [`tag`].

use super::state::Page;
use crate::browser::dom::{self, Element, Listener, Node};
use crate::browser::page::Event;
use leptos::attr::Attribute;
use leptos::attr::any_attribute::AnyAttribute;
use leptos::prelude::*;
use leptos::tachys::hydration::Cursor;
use leptos::tachys::view::add_attr::AddAnyAttr;
use leptos::tachys::view::any_view::AnyViewState;
use leptos::tachys::view::{Mountable, Position, PositionState};
use std::sync::Arc;

type LiveAttribute = Box<dyn FnMut() -> Option<String> + Send>;
type LiveText = Box<dyn FnMut() -> String + Send>;
type LiveClaim = Box<dyn FnMut() -> bool + Send>;
type LiveView = Box<dyn FnMut() -> AnyView + Send>;
type Act = Box<dyn FnMut(Event) + Send>;

/// An element being described.
pub(super) struct Markup {
    tag: &'static str,
    details: Vec<(&'static str, Detail)>,
    children: Vec<AnyView>,
}

/// Something about an element.
enum Detail {
    /// An attribute.
    Fixed(Option<String>),
    /// An attribute which follows its signals.
    Live(LiveAttribute),
    /// The text in a control.
    Text(LiveText),
    /// A claim of a control.
    Claim(LiveClaim),
    /// What is done at an event.
    Act(Act),
}

/// An element. Its name is written in capitals, as the browser gives it back.
pub(super) fn tag(name: &'static str) -> Markup {
    Markup {
        tag: name,
        details: Vec::new(),
        children: Vec::new(),
    }
}

/// A button which does something.
pub(super) fn button(act: impl FnMut() + Send + 'static) -> Markup {
    let mut act: Box<dyn FnMut() + Send> = Box::new(act);
    tag("BUTTON")
        .set("type", "button")
        .on("click", move |_| act())
}

/// A text.
#[inline(never)]
pub(super) fn words(text: String) -> AnyView {
    text.into_any()
}

/// A text which follows its signals.
pub(super) fn live_words(text: impl FnMut() -> String + Send + 'static) -> AnyView {
    #[inline(never)]
    fn erased(text: LiveText) -> AnyView {
        text.into_any()
    }
    erased(Box::new(text))
}

/// Markup which follows its signals.
pub(super) fn live(view: impl FnMut() -> AnyView + Send + 'static) -> AnyView {
    #[inline(never)]
    fn erased(view: LiveView) -> AnyView {
        view.into_any()
    }
    erased(Box::new(view))
}

/// Several views as one.
#[inline(never)]
pub(super) fn several(views: Vec<AnyView>) -> AnyView {
    views.into_any()
}

/// Nothing at all.
pub(super) fn nothing() -> AnyView {
    several(Vec::new())
}

/// A text for screen readers alone.
#[inline(never)]
pub(super) fn unseen(text: String) -> AnyView {
    tag("SPAN").class("unseen").say(text).done()
}

/// A text in which what follows a low line stands low: `I_z`.
pub(super) fn formula(text: &str) -> Vec<AnyView> {
    let mut views = Vec::new();
    let mut rest = text;
    while let Some((before, after)) = rest.split_once('_') {
        let end = after
            .find(|letter: char| !letter.is_alphanumeric())
            .unwrap_or(after.len());
        let (low, behind) = after.split_at(end);
        views.push(words(before.to_owned()));
        views.push(tag("SUB").say(low.to_owned()).done());
        rest = behind;
    }
    views.push(words(rest.to_owned()));
    views
}

/// One of several views which come and go.
#[derive(Clone)]
struct Item {
    key: String,
    view: Arc<dyn Fn() -> AnyView + Send + Sync>,
}

/// A view for each item; while an item stays, its view stays.
pub(super) fn each<T: Clone + Send + Sync + 'static>(
    items: impl Fn() -> Vec<T> + Send + Sync + 'static,
    key: fn(&T) -> String,
    view: fn(Page, T) -> AnyView,
    page: Page,
) -> AnyView {
    keyed(Box::new(move || {
        items()
            .into_iter()
            .map(|item| Item {
                key: key(&item),
                view: Arc::new(move || view(page, item.clone())),
            })
            .collect()
    }))
}

#[inline(never)]
fn keyed(items: Box<dyn Fn() -> Vec<Item> + Send + Sync>) -> AnyView {
    let props = ForProps::builder()
        .each(items)
        .key(|item: &Item| item.key.clone())
        .children(|item: Item| (item.view)())
        .build();
    For(props).into_any()
}

impl Markup {
    /// Sets an attribute.
    #[inline(never)]
    pub(super) fn set(self, name: &'static str, value: &'static str) -> Self {
        self.put(name, value.to_owned())
    }

    /// Sets an attribute to a text made for it.
    pub(super) fn put(self, name: &'static str, value: String) -> Self {
        self.maybe(name, Some(value))
    }

    /// Sets an attribute where there is a value for it.
    pub(super) fn maybe(self, name: &'static str, value: Option<String>) -> Self {
        self.detail(name, Detail::Fixed(value))
    }

    /// Sets the class.
    pub(super) fn class(self, class: &'static str) -> Self {
        self.set("class", class)
    }

    /// Sets the id.
    pub(super) fn id(self, id: &'static str) -> Self {
        self.set("id", id)
    }

    /// An attribute which follows its signals, and is there only where it has a value.
    pub(super) fn live(
        self,
        name: &'static str,
        value: impl FnMut() -> Option<String> + Send + 'static,
    ) -> Self {
        self.detail(name, Detail::Live(Box::new(value)))
    }

    /// An attribute which says `true` or `false`.
    pub(super) fn claim(
        self,
        name: &'static str,
        is_so: impl FnMut() -> bool + Send + 'static,
    ) -> Self {
        let mut is_so: LiveClaim = Box::new(is_so);
        self.live(name, move || {
            Some(if is_so() { "true" } else { "false" }.to_owned())
        })
    }

    /// Hides the element while something holds.
    pub(super) fn hidden(self, is_hidden: impl FnMut() -> bool + Send + 'static) -> Self {
        let mut is_hidden: LiveClaim = Box::new(is_hidden);
        self.live("hidden", move || is_hidden().then(String::new))
    }

    /// The text in a control, which follows its signals.
    pub(super) fn value(self, value: impl FnMut() -> String + Send + 'static) -> Self {
        self.detail("value", Detail::Text(Box::new(value)))
    }

    /// Whether a box is checked or an option picked, which follows its signals.
    pub(super) fn state(
        self,
        name: &'static str,
        is_so: impl FnMut() -> bool + Send + 'static,
    ) -> Self {
        self.detail(name, Detail::Claim(Box::new(is_so)))
    }

    /// Hears an event.
    pub(super) fn on(self, name: &'static str, act: impl FnMut(Event) + Send + 'static) -> Self {
        self.detail(name, Detail::Act(Box::new(act)))
    }

    /// Adds a text.
    #[inline(never)]
    pub(super) fn text(self, text: &'static str) -> Self {
        self.say(text.to_owned())
    }

    /// Adds a text made for it.
    #[inline(never)]
    pub(super) fn say(self, text: String) -> Self {
        self.child(words(text))
    }

    /// Adds a text which follows its signals.
    pub(super) fn live_text(self, text: impl FnMut() -> String + Send + 'static) -> Self {
        self.child(live_words(text))
    }

    /// Adds a view.
    #[inline(never)]
    pub(super) fn child(mut self, child: AnyView) -> Self {
        self.children.push(child);
        self
    }

    /// Adds an element.
    #[inline(never)]
    pub(super) fn with(self, child: Markup) -> Self {
        self.child(child.done())
    }

    /// Adds views.
    pub(super) fn children(mut self, children: impl IntoIterator<Item = AnyView>) -> Self {
        self.children.extend(children);
        self
    }

    /// The view.
    #[inline(never)]
    pub(super) fn done(self) -> AnyView {
        self.into_any()
    }

    #[inline(never)]
    fn detail(mut self, name: &'static str, detail: Detail) -> Self {
        self.details.push((name, detail));
        self
    }
}

/// An element on the page.
pub(super) struct Built {
    tag: &'static str,
    element: Option<Element>,
    details: Vec<(&'static str, BuiltDetail)>,
    children: Vec<AnyViewState>,
}

/// What is kept of a detail to change it later. Listeners and effects end when they are dropped.
enum BuiltDetail {
    Fixed(Option<String>),
    Live(RenderEffect<Option<String>>),
    Text(RenderEffect<String>),
    Claim(RenderEffect<bool>),
    Act(#[expect(dead_code, reason = "dropped with its element")] Option<Listener>),
}

impl Detail {
    /// Puts the detail on an element, where `before` is what was there of the same name.
    fn put_on(
        self,
        element: &Element,
        name: &'static str,
        before: Option<BuiltDetail>,
    ) -> BuiltDetail {
        match (self, before) {
            (Detail::Fixed(value), before) => {
                let is_same = matches!(&before, Some(BuiltDetail::Fixed(old)) if *old == value);
                // On a new element there is nothing to take away.
                if !is_same && (before.is_some() || value.is_some()) {
                    dom::set_attribute(element, name, value.as_deref());
                }
                BuiltDetail::Fixed(value)
            }
            (Detail::Live(mut value), before) => {
                let old = match before {
                    Some(BuiltDetail::Live(effect)) => effect.take_value(),
                    _ => None,
                };
                let element = element.clone();
                BuiltDetail::Live(RenderEffect::new_with_value(
                    move |old: Option<Option<String>>| {
                        let now = value();
                        if old.unwrap_or_default() != now {
                            dom::set_attribute(&element, name, now.as_deref());
                        }
                        now
                    },
                    old,
                ))
            }
            (Detail::Text(mut value), before) => {
                let old = match before {
                    Some(BuiltDetail::Text(effect)) => effect.take_value(),
                    _ => None,
                };
                let element = element.clone();
                BuiltDetail::Text(RenderEffect::new_with_value(
                    move |old: Option<String>| {
                        let now = value();
                        if old.as_ref() != Some(&now) {
                            dom::set_text(&element, name, &now);
                        }
                        now
                    },
                    old,
                ))
            }
            (Detail::Claim(mut is_so), before) => {
                let old = match before {
                    Some(BuiltDetail::Claim(effect)) => effect.take_value(),
                    _ => None,
                };
                let element = element.clone();
                BuiltDetail::Claim(RenderEffect::new_with_value(
                    move |old: Option<bool>| {
                        let now = is_so();
                        if old != Some(now) {
                            dom::set_claim(&element, name, now);
                        }
                        now
                    },
                    old,
                ))
            }
            (Detail::Act(act), before) => {
                drop(before);
                BuiltDetail::Act(Some(Listener::new(element, name, act)))
            }
        }
    }
}

impl Render for Markup {
    type State = Built;

    fn build(self) -> Built {
        let element = dom::element(self.tag);
        let Some(on) = &element else {
            // No page, nothing to show it on.
            return Built {
                tag: self.tag,
                element,
                details: Vec::new(),
                children: Vec::new(),
            };
        };
        let mut children: Vec<AnyViewState> =
            self.children.into_iter().map(Render::build).collect();
        for child in &mut children {
            child.mount(on, None);
        }
        // Behind the children: a list shows an answer only once it has its options.
        let details = self
            .details
            .into_iter()
            .map(|(name, detail)| (name, detail.put_on(on, name, None)))
            .collect();
        Built {
            tag: self.tag,
            element,
            details,
            children,
        }
    }

    fn rebuild(self, state: &mut Built) {
        let names = |details: &[(&'static str, Detail)], built: &[(&'static str, BuiltDetail)]| {
            details.len() == built.len()
                && details.iter().zip(built).all(|(new, old)| new.0 == old.0)
        };
        let is_alike = self.tag == state.tag && names(&self.details, &state.details);
        let Some(element) = state.element.clone().filter(|_| is_alike) else {
            let mut new = self.build();
            state.insert_before_this(&mut new);
            state.unmount();
            *state = new;
            return;
        };
        let mut old = std::mem::take(&mut state.children).into_iter();
        for child in self.children {
            state.children.push(match old.next() {
                Some(mut known) => {
                    child.rebuild(&mut known);
                    known
                }
                None => {
                    let mut new = child.build();
                    new.mount(&element, None);
                    new
                }
            });
        }
        for mut gone in old {
            gone.unmount();
        }
        let before = std::mem::take(&mut state.details);
        state.details = self
            .details
            .into_iter()
            .zip(before)
            .map(|((name, detail), (_, before))| {
                (name, detail.put_on(&element, name, Some(before)))
            })
            .collect();
    }
}

impl Mountable for Built {
    fn unmount(&mut self) {
        if let Some(element) = &self.element {
            element.remove();
        }
    }

    fn mount(&mut self, parent: &Element, marker: Option<&Node>) {
        if let Some(element) = &self.element {
            dom::insert(parent, element, marker);
        }
    }

    fn insert_before_this(&self, child: &mut dyn Mountable) -> bool {
        let Some(element) = &self.element else {
            return false;
        };
        let Some(parent) = element.parent_element() else {
            return false;
        };
        child.mount(&parent, Some(element));
        true
    }

    fn elements(&self) -> Vec<Element> {
        self.element.iter().cloned().collect()
    }
}

impl AddAnyAttr for Markup {
    type Output<New: Attribute> = Self;

    /// Nobody adds attributes from outside: an element says everything about itself.
    fn add_any_attr<New: Attribute>(self, _: New) -> Self {
        self
    }
}

impl RenderHtml for Markup {
    type AsyncOutput = Self;
    type Owned = Self;

    const MIN_LENGTH: usize = 0;

    fn dry_resolve(&mut self) {}

    async fn resolve(self) -> Self {
        self
    }

    /// The page is never written as text.
    fn to_html_with_buf(
        self,
        _: &mut String,
        _: &mut Position,
        _: bool,
        _: bool,
        _: Vec<AnyAttribute>,
    ) {
    }

    /// The page is never taken over from text.
    fn hydrate<const FROM_SERVER: bool>(self, _: &Cursor, _: &PositionState) -> Built {
        self.build()
    }

    fn into_owned(self) -> Self {
        self
    }
}
