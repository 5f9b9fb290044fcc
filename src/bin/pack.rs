//! The packer: turns the compiled page into one HTML file, and serves a folder on this machine alone.
//!
//! `pack build` takes what the compiler left, makes the browser's glue for it, lets `wasm-opt` shrink it where that
//! is at hand, and puts style, glue and program into the blanks of `index.html`. The file works from a server and
//! from a disk alike, because nothing in it is fetched. Its content security policy names every script and style by
//! hash and allows no connection; so what is not in the file when it is packed never runs in it.
//!
//! `pack serve` shows a folder on the loopback address, for trying the page out. It is no server for the world.
//!
//! Not here: building (that is `./dev`), and anything about sheets. Start reading at [`main`].

use std::env;
use std::fmt;
use std::fs;
use std::io;
use std::net::{Ipv4Addr, SocketAddr};
use std::path::{Component, Path, PathBuf};
use std::process::{Command, ExitCode, Stdio};

use base64::Engine;
use base64::engine::general_purpose::STANDARD as BASE64;
use sha2::{Digest, Sha256};
use tiny_http::{Header, Method, Request, Response, Server};
use wasm_bindgen_cli_support::Bindgen;

const USAGE: &str = "usage:
  pack build --wasm FILE --page FILE --style FOLDER --work FOLDER --out FOLDER [--wasm-opt PROGRAM]
  pack serve FOLDER [--port NUMBER] [--open]

build  packs a compiled page into OUT/index.html; WORK keeps the program by itself, as ventrail.wasm
serve  shows FOLDER at 127.0.0.1, at the given port or else the first free one from 8417 on;
       --open also asks the desktop, where there is one, to show the page";

/// The first port tried, and how many after it, when none is asked for.
const PORTS: std::ops::Range<u16> = 8417..8437;

/// What `wasm-opt` is told. Each feature is one which the compiler already uses and all current browsers know.
/// Never `--all-features`: it makes the import section compact, and browsers refuse that.
const SHRINK: [&str; 9] = [
    "-Oz",
    "--enable-bulk-memory",
    "--enable-nontrapping-float-to-int",
    "--enable-sign-ext",
    "--enable-mutable-globals",
    "--enable-reference-types",
    "--enable-multivalue",
    "--strip-debug",
    "--strip-producers",
];

fn main() -> ExitCode {
    let arguments: Vec<String> = env::args().skip(1).collect();
    match run(&arguments) {
        Ok(()) => ExitCode::SUCCESS,
        Err(complaint) => {
            eprintln!("pack: {complaint}");
            ExitCode::FAILURE
        }
    }
}

fn run(arguments: &[String]) -> Result<(), Complaint> {
    match arguments.split_first() {
        Some((verb, rest)) if verb == "build" => build(&BuildOrder::read(rest)?),
        Some((verb, rest)) if verb == "serve" => serve(&ServeOrder::read(rest)?),
        _ => Err(Complaint::Usage),
    }
}

/// Why the packer gave up, for the person at the terminal.
#[derive(Debug)]
enum Complaint {
    /// The command line was not understood.
    Usage,
    /// A file could not be read or written.
    File { path: PathBuf, cause: io::Error },
    /// The browser's glue could not be made.
    Glue(String),
    /// The shrinking program could not be run, or ended badly.
    Shrink { program: PathBuf, cause: String },
    /// The page's source does not have the shape that packing needs.
    Page(String),
    /// No port could be had.
    Port(String),
}

impl fmt::Display for Complaint {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        match self {
            Self::Usage => f.write_str(USAGE),
            Self::File { path, cause } => write!(f, "{}: {cause}", path.display()),
            Self::Glue(cause) => write!(f, "no glue could be made for the program: {cause}"),
            Self::Shrink { program, cause } => {
                write!(f, "{} did not do its work: {cause}", program.display())
            }
            Self::Page(what) => write!(f, "the page cannot be packed: {what}"),
            Self::Port(cause) => write!(f, "the page cannot be served: {cause}"),
        }
    }
}

/// What `pack build` was asked for.
struct BuildOrder {
    wasm: PathBuf,
    page: PathBuf,
    style: PathBuf,
    work: PathBuf,
    out: PathBuf,
    shrink: Option<PathBuf>,
}

impl BuildOrder {
    fn read(arguments: &[String]) -> Result<Self, Complaint> {
        let (mut wasm, mut page, mut style, mut work, mut out, mut shrink) =
            (None, None, None, None, None, None);
        for pair in arguments.chunks(2) {
            let [name, value] = pair else {
                return Err(Complaint::Usage);
            };
            let place = match name.as_str() {
                "--wasm" => &mut wasm,
                "--page" => &mut page,
                "--style" => &mut style,
                "--work" => &mut work,
                "--out" => &mut out,
                "--wasm-opt" => &mut shrink,
                _ => return Err(Complaint::Usage),
            };
            *place = Some(PathBuf::from(value));
        }
        match (wasm, page, style, work, out) {
            (Some(wasm), Some(page), Some(style), Some(work), Some(out)) => Ok(Self {
                wasm,
                page,
                style,
                work,
                out,
                shrink,
            }),
            _ => Err(Complaint::Usage),
        }
    }
}

fn build(order: &BuildOrder) -> Result<(), Complaint> {
    make_folder(&order.work)?;
    make_folder(&order.out)?;
    let program = bind(&order.wasm)?;
    let wasm = match &order.shrink {
        Some(shrink) => shrunk(&program.wasm, shrink, &order.work)?,
        None => program.wasm,
    };
    write(&order.work.join("ventrail.wasm"), &wasm)?;

    let page = assemble(&Parts {
        page: &read_text(&order.page)?,
        style: &read_styles(&order.style)?,
        glue: &program.glue,
        wasm: &wasm,
    })?;
    write(&order.out.join("index.html"), page.as_bytes())
}

/// A program that a browser can load: its bytes, and the script which ties them to the page.
struct Program {
    wasm: Vec<u8>,
    glue: String,
}

fn bind(wasm: &Path) -> Result<Program, Complaint> {
    let complain = |cause| Complaint::Glue(format!("{cause:#}"));
    let mut binding = Bindgen::new();
    binding
        .input_path(wasm)
        .out_name("ventrail")
        .typescript(false);
    binding.no_modules(true).map_err(complain)?;
    let mut output = binding.generate_output().map_err(complain)?;
    // A crate that carries scripts of its own needs modules, which cannot be loaded from a disk.
    let scripts: Vec<&str> = output
        .snippets()
        .iter()
        .filter(|(_, scripts)| !scripts.is_empty())
        .map(|(name, _)| name.as_str())
        .chain(output.local_modules().keys().map(String::as_str))
        .collect();
    if !scripts.is_empty() {
        return Err(Complaint::Glue(format!(
            "these carry scripts of their own, which one file cannot hold: {}",
            scripts.join(", ")
        )));
    }
    Ok(Program {
        glue: output.js().to_owned(),
        wasm: output.wasm_mut().emit_wasm(),
    })
}

fn shrunk(wasm: &[u8], program: &Path, work: &Path) -> Result<Vec<u8>, Complaint> {
    let complain = |cause: String| Complaint::Shrink {
        program: program.to_owned(),
        cause,
    };
    let (before, after) = (work.join("before.wasm"), work.join("after.wasm"));
    write(&before, wasm)?;
    let outcome = Command::new(program)
        .args(SHRINK)
        .arg(&before)
        .arg("-o")
        .arg(&after)
        .output()
        .map_err(|cause| complain(cause.to_string()))?;
    if !outcome.status.success() {
        return Err(complain(
            String::from_utf8_lossy(&outcome.stderr).trim().to_owned(),
        ));
    }
    read(&after)
}

/// What goes into the blanks of the page.
struct Parts<'a> {
    page: &'a str,
    style: &'a str,
    glue: &'a str,
    wasm: &'a [u8],
}

/// The finished page: blanks filled, policy last, because it is made from all that stands in the page.
fn assemble(parts: &Parts) -> Result<String, Complaint> {
    if parts.style.to_ascii_lowercase().contains("</style") {
        return Err(Complaint::Page("a style sheet holds an end tag".to_owned()));
    }
    let filled = fill(
        parts.page,
        &[
            ("build", &build_name(parts.wasm)),
            ("style", parts.style),
            ("glue", &as_script(parts.glue)),
            ("wasm", &BASE64.encode(parts.wasm)),
        ],
    )?;
    let policy = policy(&filled)?;
    Ok(filled.replacen(POLICY_BLANK, &policy, 1))
}

const POLICY_BLANK: &str = "{{policy}}";

/// Which program this is: the version of the package, and the beginning of the hash of the program's bytes.
fn build_name(wasm: &[u8]) -> String {
    let digest = Sha256::digest(wasm);
    let short: String = digest
        .iter()
        .take(4)
        .map(|byte| format!("{byte:02x}"))
        .collect();
    format!("{}+{short}", env!("CARGO_PKG_VERSION"))
}

/// The page with each `{{name}}` replaced by its value; the blank of the policy stays.
///
/// One pass from front to back, so that braces inside a value are left as they are. Each name must occur once.
fn fill(page: &str, values: &[(&str, &str)]) -> Result<String, Complaint> {
    if !page.contains(POLICY_BLANK) {
        return Err(Complaint::Page(format!(
            "its source has no blank {POLICY_BLANK}"
        )));
    }
    let mut filled = String::new();
    let mut rest = page;
    let mut used = Vec::new();
    while let Some((before, after)) = rest.split_once("{{") {
        let Some((name, after)) = after.split_once("}}") else {
            return Err(Complaint::Page(
                "a blank in its source is not closed".to_owned(),
            ));
        };
        filled.push_str(before);
        match values.iter().find(|(known, _)| *known == name) {
            Some((known, value)) if !used.contains(known) => {
                used.push(*known);
                filled.push_str(value);
            }
            None if name == "policy" => filled.push_str(POLICY_BLANK),
            Some(_) => {
                return Err(Complaint::Page(format!(
                    "its source has the blank {name} twice"
                )));
            }
            None => {
                return Err(Complaint::Page(format!(
                    "its source has a blank of unknown name, {name}"
                )));
            }
        }
        rest = after;
    }
    filled.push_str(rest);
    match values.iter().find(|(name, _)| !used.contains(name)) {
        Some((name, _)) => Err(Complaint::Page(format!("its source has no blank {name}"))),
        None => Ok(filled),
    }
}

/// A script which can stand inside a page: the two marks that would end or hide it are written differently.
fn as_script(script: &str) -> String {
    let mut safe = String::with_capacity(script.len());
    let mut rest = script;
    while let Some(at) = rest.find('<') {
        let (before, tail) = rest.split_at(at);
        safe.push_str(before);
        let is_end_tag = tail
            .get(..8)
            .is_some_and(|tag| tag.eq_ignore_ascii_case("</script"));
        let (written, taken) = if is_end_tag {
            ("<\\/", 2)
        } else if tail.starts_with("<!--") {
            ("<\\!--", 4)
        } else {
            ("<", 1)
        };
        safe.push_str(written);
        rest = tail.get(taken..).unwrap_or_default();
    }
    safe.push_str(rest);
    safe
}

/// The content security policy of a page: what stands in it may run, nothing may be fetched or sent.
///
/// `wasm-unsafe-eval` is the leave to compile the program; without it nothing starts. It does not allow `eval`.
fn policy(page: &str) -> Result<String, Complaint> {
    let inline = inline_texts(page)?;
    let hashes = |kind: Inline| -> String {
        let texts = inline.iter().filter(|(is, _)| *is == kind);
        texts
            .map(|(_, text)| format!("'sha256-{}' ", BASE64.encode(Sha256::digest(text))))
            .collect()
    };
    Ok([
        "default-src 'none'",
        &format!("script-src {}'wasm-unsafe-eval'", hashes(Inline::Script)),
        &format!("style-src {}", hashes(Inline::Style).trim_end()),
        "img-src data:",
        "connect-src 'none'",
        "form-action 'none'",
        "base-uri 'none'",
    ]
    .join("; "))
}

/// The two elements whose text is no markup, and has to be allowed by its hash.
#[derive(Clone, Copy, PartialEq, Eq)]
enum Inline {
    Script,
    Style,
}

impl Inline {
    const ALL: [(Self, &str, &str); 2] = [
        (Self::Script, "<script", "</script>"),
        (Self::Style, "<style", "</style>"),
    ];
}

/// What the scripts and styles of a page hold, in its order. Comments are passed over.
fn inline_texts(page: &str) -> Result<Vec<(Inline, &str)>, Complaint> {
    let mut found = Vec::new();
    let mut rest = page;
    while let Some(at) = rest.find('<') {
        let tag = rest.get(at..).unwrap_or_default();
        let element = Inline::ALL
            .iter()
            .find(|(_, open, _)| tag.starts_with(open));
        rest = if let Some(comment) = tag.strip_prefix("<!--") {
            comment.split_once("-->").map_or("", |(_, after)| after)
        } else if let Some((kind, open, close)) = element {
            let body = tag
                .strip_prefix(open)
                .and_then(|tail| tail.strip_prefix('>'));
            let Some((text, after)) = body.and_then(|body| body.split_once(close)) else {
                return Err(Complaint::Page(format!(
                    "{open} has attributes or no end; its hash cannot be taken"
                )));
            };
            found.push((*kind, text));
            after
        } else {
            tag.strip_prefix('<').unwrap_or_default()
        };
    }
    Ok(found)
}

/// All style sheets of a folder as one text, in the order of their names.
fn read_styles(folder: &Path) -> Result<String, Complaint> {
    let complain = |cause| Complaint::File {
        path: folder.to_owned(),
        cause,
    };
    let mut paths = Vec::new();
    for entry in fs::read_dir(folder).map_err(complain)? {
        let path = entry.map_err(complain)?.path();
        if path.extension().is_some_and(|ending| ending == "css") {
            paths.push(path);
        }
    }
    paths.sort();
    let texts: Result<Vec<String>, Complaint> = paths.iter().map(|path| read_text(path)).collect();
    Ok(texts?.join("\n"))
}

/// A text file with plain line ends: a browser reads a page so before it takes hashes.
fn read_text(path: &Path) -> Result<String, Complaint> {
    let text = fs::read_to_string(path).map_err(|cause| Complaint::File {
        path: path.to_owned(),
        cause,
    })?;
    Ok(text.replace("\r\n", "\n"))
}

fn read(path: &Path) -> Result<Vec<u8>, Complaint> {
    fs::read(path).map_err(|cause| Complaint::File {
        path: path.to_owned(),
        cause,
    })
}

fn write(path: &Path, bytes: &[u8]) -> Result<(), Complaint> {
    fs::write(path, bytes).map_err(|cause| Complaint::File {
        path: path.to_owned(),
        cause,
    })
}

fn make_folder(path: &Path) -> Result<(), Complaint> {
    fs::create_dir_all(path).map_err(|cause| Complaint::File {
        path: path.to_owned(),
        cause,
    })
}

/// What `pack serve` was asked for.
struct ServeOrder {
    folder: PathBuf,
    port: Option<u16>,
    shows_page: bool,
}

impl ServeOrder {
    fn read(arguments: &[String]) -> Result<Self, Complaint> {
        let (mut folder, mut port, mut shows_page) = (None, None, false);
        let mut rest = arguments.iter();
        while let Some(argument) = rest.next() {
            match argument.as_str() {
                "--open" => shows_page = true,
                "--port" => {
                    let number = rest.next().and_then(|text| text.parse().ok());
                    port = Some(number.ok_or(Complaint::Usage)?);
                }
                name if name.starts_with('-') || folder.is_some() => return Err(Complaint::Usage),
                name => folder = Some(PathBuf::from(name)),
            }
        }
        Ok(Self {
            folder: folder.ok_or(Complaint::Usage)?,
            port,
            shows_page,
        })
    }
}

fn serve(order: &ServeOrder) -> Result<(), Complaint> {
    let (server, port) = listen(order.port)?;
    let address = format!("http://{}:{port}/", Ipv4Addr::LOCALHOST);
    println!("Ventrail is at {address} (Ctrl-C ends it)");
    if order.shows_page {
        show(&address);
    }
    for request in server.incoming_requests() {
        answer(request, &order.folder);
    }
    Ok(())
}

/// A server at the wished port, or at the first free one of [`PORTS`]; and its port.
fn listen(wished: Option<u16>) -> Result<(Server, u16), Complaint> {
    let candidates: Vec<u16> = wished.map_or_else(|| PORTS.collect(), |port| vec![port]);
    let mut refusal = String::new();
    for port in candidates {
        match Server::http(SocketAddr::from((Ipv4Addr::LOCALHOST, port))) {
            Ok(server) => {
                let taken = server
                    .server_addr()
                    .to_ip()
                    .map_or(port, |address| address.port());
                return Ok((server, taken));
            }
            Err(cause) => refusal = format!("port {port}: {cause}"),
        }
    }
    Err(Complaint::Port(refusal))
}

/// Asks the desktop to show an address. Without a desktop, or when it declines, the printed address has to do.
fn show(address: &str) {
    let has_desktop = env::var_os("DISPLAY").is_some() || env::var_os("WAYLAND_DISPLAY").is_some();
    if has_desktop {
        let silent = || Stdio::null();
        let _declined = Command::new("xdg-open")
            .arg(address)
            .stdin(silent())
            .stdout(silent())
            .stderr(silent())
            .spawn();
    }
}

fn answer(request: Request, folder: &Path) {
    let is_read = matches!(request.method(), Method::Get | Method::Head);
    let file = is_read
        .then(|| wanted_file(folder, request.url()))
        .flatten();
    let found = file.and_then(|path| Some((fs::read(&path).ok()?, path)));
    // A visitor who has left does not hear the answer: nothing to do about it.
    let _left = match found {
        Some((bytes, path)) => {
            let mut headers = vec![
                header("Content-Type", content_type(&path)),
                header("Cache-Control", "no-cache"),
            ];
            headers.push(header("X-Content-Type-Options", "nosniff"));
            if let Some(policy) = std::str::from_utf8(&bytes).ok().and_then(written_policy) {
                headers.push(header("Content-Security-Policy", policy));
            }
            let mut response = Response::from_data(bytes);
            for header in headers.into_iter().flatten() {
                response.add_header(header);
            }
            request.respond(response)
        }
        None => request.respond(
            Response::from_string("There is nothing at this address.\n").with_status_code(404),
        ),
    };
}

/// The file meant by the path of a request, if it lies in the folder; a folder means its index.
fn wanted_file(folder: &Path, url: &str) -> Option<PathBuf> {
    let path = url.split(['?', '#']).next()?.strip_prefix('/')?;
    let relative = Path::new(if path.is_empty() { "index.html" } else { path });
    let stays_inside = relative
        .components()
        .all(|part| matches!(part, Component::Normal(_)));
    stays_inside
        .then(|| folder.join(relative))
        .filter(|path| path.is_file())
}

fn content_type(path: &Path) -> &'static str {
    match path.extension().and_then(|ending| ending.to_str()) {
        Some("html") => "text/html; charset=utf-8",
        Some("css") => "text/css; charset=utf-8",
        Some("js") => "text/javascript; charset=utf-8",
        Some("json") => "application/json",
        Some("webmanifest") => "application/manifest+json",
        Some("wasm") => "application/wasm",
        Some("svg") => "image/svg+xml",
        Some("png") => "image/png",
        Some("txt") => "text/plain; charset=utf-8",
        _ => "application/octet-stream",
    }
}

fn header(name: &str, value: &str) -> Option<Header> {
    Header::from_bytes(name, value).ok()
}

/// The policy which a packed page carries, to be sent with it as a header too.
fn written_policy(page: &str) -> Option<&str> {
    let (_, after) = page.split_once("http-equiv=\"Content-Security-Policy\" content=\"")?;
    after.split_once('"').map(|(policy, _)| policy)
}

#[cfg(test)]
mod tests {
    use super::*;

    const PAGE: &str = "<meta http-equiv=\"Content-Security-Policy\" content=\"{{policy}}\"><meta content=\"{{build}}\">\
                        <!-- <script> in a remark --><style>{{style}}</style><script>{{glue}}</script><script>go(\"{{wasm}}\")</script>";

    fn packed(glue: &str, style: &str) -> Result<String, Complaint> {
        assemble(&Parts {
            page: PAGE,
            style,
            glue,
            wasm: b"\0asm",
        })
    }

    fn hash(text: &str) -> String {
        format!(
            "'sha256-{}'",
            BASE64.encode(Sha256::digest(text.as_bytes()))
        )
    }

    #[test]
    fn hash_is_the_one_of_the_standard() {
        // FIPS 180-2, appendix B.1: the digest of "abc".
        let digest = "ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad";
        let hex: String = Sha256::digest(b"abc")
            .iter()
            .map(|byte| format!("{byte:02x}"))
            .collect();
        assert_eq!(hex, digest);
    }

    #[test]
    fn policy_names_every_script_and_style_and_nothing_else() {
        let page = packed("let a = 1;", "p{margin:0}").expect("packs");
        let policy = written_policy(&page).expect("carries a policy").to_owned();
        let wasm = BASE64.encode(b"\0asm");
        let scripts = format!(
            "script-src {} {} 'wasm-unsafe-eval';",
            hash("let a = 1;"),
            hash(&format!("go(\"{wasm}\")"))
        );
        assert!(policy.contains(&scripts), "{policy}");
        assert!(
            policy.contains(&format!("style-src {};", hash("p{margin:0}"))),
            "{policy}"
        );
        assert!(policy.starts_with("default-src 'none';") && policy.contains("connect-src 'none'"));
        assert!(!policy.contains("unsafe-inline") && !policy.contains("'unsafe-eval'"));
    }

    #[test]
    fn tags_inside_a_script_or_a_style_do_not_count() {
        let page =
            packed("put('<style>b{}</style>')", "p::after{content:'<script>'}").expect("packs");
        let policy = written_policy(&page).expect("carries a policy").to_owned();
        assert_eq!(policy.matches("sha256-").count(), 3, "{policy}");
        assert!(policy.contains(&hash("p::after{content:'<script>'}")));
    }

    #[test]
    fn script_which_cannot_be_hashed_is_refused() {
        for page in [
            "<script src=x></script>",
            "<script>endless",
            "<style media=print></style>",
        ] {
            assert!(policy(page).is_err(), "{page}");
        }
        assert!(policy("<!-- <script src=x> --><style></style>").is_ok());
    }

    #[test]
    fn script_can_neither_end_nor_hide_itself() {
        assert_eq!(
            as_script("a('</script>', '</SCRIPT >', '<!-- x')"),
            "a('<\\/script>', '<\\/SCRIPT >', '<\\!-- x')"
        );
        assert_eq!(as_script("i < n && '</p>' <é"), "i < n && '</p>' <é");
    }

    #[test]
    fn style_which_ends_itself_is_refused() {
        assert!(packed("", "p{}</style>").is_err());
    }

    #[test]
    fn blanks_are_each_filled_once() {
        let value = [("a", "{{b}} stays")];
        assert_eq!(
            fill("{{policy}} x {{a}} y", &value).expect("fills"),
            "{{policy}} x {{b}} stays y"
        );
        for page in [
            "{{a}}",
            "{{policy}} {{a}} {{a}}",
            "{{policy}} {{c}} {{a}}",
            "{{policy}}",
            "{{policy}} {{a",
        ] {
            assert!(fill(page, &value).is_err(), "{page}");
        }
    }

    #[test]
    fn build_name_changes_with_the_program() {
        assert_ne!(build_name(b"one"), build_name(b"two"));
        assert!(build_name(b"one").starts_with(concat!(env!("CARGO_PKG_VERSION"), "+")));
    }

    #[test]
    fn server_gives_no_file_from_outside_its_folder() {
        let folder = Path::new(env!("CARGO_MANIFEST_DIR")).join("src");
        assert_eq!(
            wanted_file(&folder, "/main.rs?x=1"),
            Some(folder.join("main.rs"))
        );
        for url in [
            "/../Cargo.toml",
            "//etc/passwd",
            "/bin/../../Cargo.toml",
            "/nothing",
            "/bin",
            "main.rs",
            "/",
        ] {
            assert_eq!(wanted_file(&folder, url), None, "{url}");
        }
    }

    #[test]
    fn orders_are_read_or_refused() {
        let words = |text: &str| {
            text.split_whitespace()
                .map(str::to_owned)
                .collect::<Vec<_>>()
        };
        let order = ServeOrder::read(&words("dist --port 9000 --open")).expect("understood");
        assert_eq!(
            (order.folder, order.port, order.shows_page),
            (PathBuf::from("dist"), Some(9000), true)
        );
        for text in [
            "",
            "dist --port",
            "dist --port x",
            "dist other",
            "dist --loud",
        ] {
            assert!(ServeOrder::read(&words(text)).is_err(), "{text}");
        }
        let full = "--wasm a --page b --style c --work d --out e";
        assert!(BuildOrder::read(&words(full)).is_ok_and(|order| order.shrink.is_none()));
        assert!(BuildOrder::read(&words("--wasm a --page b")).is_err());
        assert!(BuildOrder::read(&words("--wasm a --page b --style c --work d --out")).is_err());
    }
}
