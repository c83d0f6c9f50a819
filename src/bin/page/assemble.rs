//! Scripts, styles and the core into one HTML file under a strict policy.

use super::core_wasm::Core;
use base64::Engine;
use base64::engine::general_purpose::STANDARD;
use flate2::Compression;
use flate2::write::DeflateEncoder;
use sha2::{Digest, Sha256};
use std::error::Error;
use std::io::Write;
use std::path::Path;

/// The whole page as text.
///
/// `index.html` lists what ships: `<link rel="stylesheet" href="...">` and classic `<script src="...">`, each on
/// a line of its own. They are replaced by one inline style, the core as text that is not run, and one inline
/// script that begins with the glue of the core.
pub fn page(folder: &Path, core: &Core) -> Result<String, Box<dyn Error>> {
    let index = std::fs::read_to_string(folder.join("index.html"))?;
    let (mut style, mut script) = (String::new(), core.glue.clone());
    let mut kept = String::new();
    for line in index.lines() {
        if let Some(name) = named(line, "<link rel=\"stylesheet\" href=\"") {
            style += &std::fs::read_to_string(folder.join(name))?;
        } else if let Some(name) = named(line, "<script src=\"") {
            script += "\n";
            script += &std::fs::read_to_string(folder.join(name))?;
        } else {
            kept += line;
            kept += "\n";
        }
    }
    let script = script.replace("</script", "<\\/script");
    let head = format!("{}<style>{style}</style>\n</head>", policy(&script, &style));
    let foot = format!(
        "<script type=\"application/octet-stream;base64\" id=\"core\">{}</script>\n<script>{script}</script>\n</body>",
        STANDARD.encode(deflated(&core.wasm)?)
    );
    let with_head = replace_once(&kept, "</head>", &head)?;
    replace_once(&with_head, "</body>", &foot)
}

/// Compressed as the browser's own `DecompressionStream("deflate-raw")` takes it (RFC 1951): less than half to
/// carry and to decode.
fn deflated(bytes: &[u8]) -> std::io::Result<Vec<u8>> {
    let mut encoder = DeflateEncoder::new(Vec::new(), Compression::best());
    encoder.write_all(bytes)?;
    encoder.finish()
}

/// The file that a line brings in, if it begins so.
fn named<'a>(line: &'a str, opening: &str) -> Option<&'a str> {
    line.trim_start().strip_prefix(opening)?.split('"').next()
}

/// Nothing is loaded, nothing is sent: only the one script, the one style and the core that are in the file.
fn policy(script: &str, style: &str) -> String {
    format!(
        "<meta http-equiv=\"Content-Security-Policy\" content=\"default-src 'none'; connect-src 'none'; \
         script-src '{}' 'wasm-unsafe-eval'; style-src '{}'; img-src data: blob:; base-uri 'none'; \
         form-action 'none'\">\n",
        source(script),
        source(style)
    )
}

fn source(text: &str) -> String {
    format!("sha256-{}", STANDARD.encode(Sha256::digest(text.as_bytes())))
}

/// SHA-256 as hexadecimal digits.
pub fn sha256_hex(bytes: &[u8]) -> String {
    let digits: Vec<String> = Sha256::digest(bytes).iter().map(|byte| format!("{byte:02x}")).collect();
    digits.concat()
}

fn replace_once(text: &str, from: &str, to: &str) -> Result<String, Box<dyn Error>> {
    if text.matches(from).count() != 1 {
        return Err(format!("index.html must hold {from} exactly once").into());
    }
    Ok(text.replacen(from, to, 1))
}
