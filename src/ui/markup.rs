//! Markup in one type: elements whose attributes and children are held in lists.
//!
//! A view in which every element has a type of its own makes the program three times as large, since each of them is
//! compiled apart. Here everything is erased where it is made, so the code which builds and updates the page exists
//! once. What a fixed text, a live text, an attribute and a listener are is Leptos' own.

use crate::browser::page::Event;
use leptos::attr::any_attribute::{AnyAttribute, IntoAnyAttribute};
use leptos::attr::custom::custom_attribute;
use leptos::ev;
use leptos::html::custom;
use leptos::prelude::*;
use leptos::tachys::html::event::on;
use leptos::tachys::html::property::prop;

type BoxedText = Box<dyn FnMut() -> String + Send>;
type BoxedClaim = Box<dyn FnMut() -> bool + Send>;

/// An element being described.
pub(super) struct Markup {
    tag: &'static str,
    attributes: Vec<AnyAttribute>,
    children: Vec<AnyView>,
}

/// An element. Its name is written in capitals, as the browser gives it back, so that the page is updated in place.
pub(super) fn tag(name: &'static str) -> Markup {
    Markup {
        tag: name,
        attributes: Vec::new(),
        children: Vec::new(),
    }
}

/// A button which does something.
pub(super) fn button(act: impl FnMut() + 'static) -> Markup {
    let mut act: Box<dyn FnMut()> = Box::new(act);
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
    fn erased(text: BoxedText) -> AnyView {
        text.into_any()
    }
    erased(Box::new(text))
}

/// Markup which follows its signals.
pub(super) fn live(view: impl FnMut() -> AnyView + Send + 'static) -> AnyView {
    #[inline(never)]
    fn erased(view: Box<dyn FnMut() -> AnyView + Send>) -> AnyView {
        view.into_any()
    }
    erased(Box::new(view))
}

/// Several views as one.
#[inline(never)]
pub(super) fn several(views: Vec<AnyView>) -> AnyView {
    views.into_any()
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

/// Nothing at all.
pub(super) fn nothing() -> AnyView {
    several(Vec::new())
}

/// A text for screen readers alone.
#[inline(never)]
pub(super) fn unseen(text: String) -> AnyView {
    tag("SPAN").class("unseen").say(text).done()
}

/// One of several views which come and go.
#[derive(Clone)]
struct Item {
    key: String,
    view: std::sync::Arc<dyn Fn() -> AnyView + Send + Sync>,
}

/// A view for each item; while an item stays, its view stays.
pub(super) fn each<T: Clone + Send + Sync + 'static>(
    items: impl Fn() -> Vec<T> + Send + Sync + 'static,
    key: fn(&T) -> String,
    view: fn(super::state::Page, T) -> AnyView,
    page: super::state::Page,
) -> AnyView {
    let items: Box<dyn Fn() -> Vec<Item> + Send + Sync> = Box::new(move || {
        items()
            .into_iter()
            .map(|item| Item {
                key: key(&item),
                view: std::sync::Arc::new(move || view(page, item.clone())),
            })
            .collect()
    });
    keyed(items)
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
    #[inline(never)]
    pub(super) fn put(mut self, name: &'static str, value: String) -> Self {
        self.attributes
            .push(custom_attribute(name, value).into_any_attr());
        self
    }

    /// Sets an attribute where there is a value for it.
    #[inline(never)]
    pub(super) fn maybe(mut self, name: &'static str, value: Option<String>) -> Self {
        self.attributes
            .push(custom_attribute(name, value).into_any_attr());
        self
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
        self.add_live(name, Box::new(value))
    }

    /// An attribute which says `true` or `false`.
    pub(super) fn claim(
        self,
        name: &'static str,
        is_so: impl FnMut() -> bool + Send + 'static,
    ) -> Self {
        let mut is_so: BoxedClaim = Box::new(is_so);
        self.add_live(
            name,
            Box::new(move || Some(if is_so() { "true" } else { "false" }.to_owned())),
        )
    }

    /// Hides the element while something holds.
    pub(super) fn hidden(self, is_hidden: impl FnMut() -> bool + Send + 'static) -> Self {
        let mut is_hidden: BoxedClaim = Box::new(is_hidden);
        self.add_live("hidden", Box::new(move || is_hidden().then(String::new)))
    }

    /// The text in a control, which follows its signals.
    pub(super) fn value(self, value: impl FnMut() -> String + Send + 'static) -> Self {
        self.add_value(Box::new(value))
    }

    /// Whether a box is checked or an option picked, which follows its signals.
    pub(super) fn state(
        self,
        name: &'static str,
        is_so: impl FnMut() -> bool + Send + 'static,
    ) -> Self {
        self.add_state(name, Box::new(is_so))
    }

    /// Hears an event.
    pub(super) fn on(self, name: &'static str, act: impl FnMut(Event) + 'static) -> Self {
        self.add_listener(name, Box::new(act))
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
    pub(super) fn children(self, children: impl IntoIterator<Item = AnyView>) -> Self {
        self.add_children(children.into_iter().collect())
    }

    /// The view.
    #[inline(never)]
    pub(super) fn done(self) -> AnyView {
        custom(self.tag)
            .child(self.children)
            .add_any_attr(self.attributes)
            .into_any()
    }

    #[inline(never)]
    fn add_live(
        mut self,
        name: &'static str,
        value: Box<dyn FnMut() -> Option<String> + Send>,
    ) -> Self {
        self.attributes
            .push(custom_attribute(name, value).into_any_attr());
        self
    }

    #[inline(never)]
    fn add_value(mut self, value: BoxedText) -> Self {
        self.attributes.push(prop("value", value).into_any_attr());
        self
    }

    #[inline(never)]
    fn add_state(mut self, name: &'static str, is_so: BoxedClaim) -> Self {
        self.attributes.push(prop(name, is_so).into_any_attr());
        self
    }

    #[inline(never)]
    fn add_listener(mut self, name: &'static str, act: Box<dyn FnMut(Event)>) -> Self {
        self.attributes
            .push(on(ev::Custom::<Event>::new(name), act).into_any_attr());
        self
    }

    #[inline(never)]
    fn add_children(mut self, children: Vec<AnyView>) -> Self {
        self.children.extend(children);
        self
    }
}
