//! The server of one scenario: serves the packed page, and writes down what is asked of it.
//!
//! It answers one request for each connection and then closes it. So when it is stopped nothing is left open, and the
//! browser is refused as by a server that has gone.

use std::collections::HashMap;
use std::fs;
use std::io::{self, BufRead, BufReader, Write};
use std::net::{Ipv4Addr, TcpListener, TcpStream};
use std::path::{Path, PathBuf};
use std::sync::{Arc, Mutex, MutexGuard, PoisonError};
use std::thread::{self, JoinHandle};

use super::Outcome;

/// A running server on a free port of this machine. It ends when it is dropped.
pub struct Site {
    port: u16,
    notes: Arc<Mutex<Notes>>,
    thread: Option<JoinHandle<()>>,
}

#[derive(Default)]
struct Notes {
    requests: Vec<String>,
    extras: HashMap<String, String>,
    is_closing: bool,
}

impl Site {
    /// Starts serving `dist/`.
    pub fn start() -> Outcome<Self> {
        packed_page()?;
        let listener = TcpListener::bind((Ipv4Addr::LOCALHOST, 0))?;
        let port = listener.local_addr()?.port();
        let notes = Arc::new(Mutex::new(Notes::default()));
        let thread = thread::spawn({
            let notes = Arc::clone(&notes);
            move || serve(&listener, &notes)
        });
        Ok(Self {
            port,
            notes,
            thread: Some(thread),
        })
    }

    /// The address under which the page is served.
    pub fn address(&self) -> String {
        format!("http://{}:{}/", Ipv4Addr::LOCALHOST, self.port)
    }

    /// What was asked for so far, each as method and path.
    pub fn requests(&self) -> Vec<String> {
        hold(&self.notes).requests.clone()
    }

    /// Serves one more text, at a path such as `/other`.
    pub fn add(&self, path: &str, text: &str) {
        hold(&self.notes)
            .extras
            .insert(path.to_owned(), text.to_owned());
    }

    /// Ends the server; from now on its port refuses connections.
    pub fn stop(&mut self) {
        let Some(thread) = self.thread.take() else {
            return;
        };
        hold(&self.notes).is_closing = true;
        // The server waits for a visitor; this one makes it look up and see that it is closing.
        let _visit = TcpStream::connect((Ipv4Addr::LOCALHOST, self.port));
        // A server that panicked has ended as well.
        let _ended = thread.join();
    }
}

impl Drop for Site {
    fn drop(&mut self) {
        self.stop();
    }
}

/// The file which `./dev build` made.
pub fn packed_page() -> Outcome<PathBuf> {
    let file = dist().join("index.html");
    if file.is_file() {
        Ok(file)
    } else {
        Err("there is no dist/index.html yet: ./dev build makes it".into())
    }
}

fn dist() -> PathBuf {
    Path::new(env!("CARGO_MANIFEST_DIR")).join("dist")
}

fn serve(listener: &TcpListener, notes: &Arc<Mutex<Notes>>) {
    for visitor in listener.incoming() {
        if hold(notes).is_closing {
            return;
        }
        let notes = Arc::clone(notes);
        // Browsers open connections ahead of need, so none may keep the others waiting; one that breaks off is gone.
        thread::spawn(move || visitor.and_then(|visitor| answer(visitor, &notes)));
    }
}

fn answer(mut visitor: TcpStream, notes: &Mutex<Notes>) -> io::Result<()> {
    let mut lines = BufReader::new(visitor.try_clone()?).lines();
    let Some(first) = lines.next().transpose()? else {
        return Ok(());
    };
    while lines
        .next()
        .transpose()?
        .is_some_and(|line| !line.is_empty())
    {}

    let mut words = first.split(' ');
    let (method, path) = (
        words.next().unwrap_or_default(),
        words.next().unwrap_or_default(),
    );
    let extra = {
        let mut notes = hold(notes);
        // A connection which the browser opened ahead of need outlives the listener, but not the server.
        if notes.is_closing {
            return Ok(());
        }
        notes.requests.push(format!("{method} {path}"));
        notes.extras.get(path).cloned()
    };
    let page = || {
        (path == "/")
            .then(|| fs::read(dist().join("index.html")).ok())
            .flatten()
    };
    let (status, body) = match extra.map(String::into_bytes).or_else(page) {
        Some(body) => ("200 OK", body),
        None => ("404 Not Found", Vec::new()),
    };
    let length = body.len();
    let head = format!(
        "HTTP/1.1 {status}\r\nContent-Type: text/html; charset=utf-8\r\nContent-Length: {length}\r\n\
         Cache-Control: no-cache\r\nConnection: close\r\n\r\n"
    );
    visitor.write_all(head.as_bytes())?;
    visitor.write_all(&body)
}

/// The notes, also after a thread that held them has panicked: a list of requests cannot be left half done.
fn hold(notes: &Mutex<Notes>) -> MutexGuard<'_, Notes> {
    notes.lock().unwrap_or_else(PoisonError::into_inner)
}
