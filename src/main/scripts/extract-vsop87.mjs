// Makes src/main/resources/quietspan/astro/vsop87b.txt from the npm package astronomia 4.2.0, which carries
// the VSOP87B series (P. Bretagnon and G. Francou, Planetary theories in rectangular and spherical variables,
// Astronomy and Astrophysics 202:309-315, 1988).
//
//   npm pack astronomia@4.2.0
//   node src/main/scripts/extract-vsop87.mjs astronomia-4.2.0.tgz src/main/resources/quietspan/astro/vsop87b.txt
//
// The hash of the package is checked first; the same package gives the same bytes.
import { createHash } from "node:crypto";
import { execFileSync } from "node:child_process";
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { pathToFileURL } from "node:url";

const SHA256 = "ac5f73398a6c788f9ee371011258f18a72b5194009b3c7fc6e702dffe230e679";
const [, , packed, target] = process.argv;
const found = createHash("sha256").update(readFileSync(packed)).digest("hex");
if (found !== SHA256) {
  console.error(`${packed}: SHA-256 is ${found}, not ${SHA256}`);
  process.exit(2);
}
const folder = mkdtempSync(join(tmpdir(), "vsop87-"));
execFileSync("tar", ["xzf", packed, "-C", folder]);

// Earth whole; the others only move the barycentre: terms below the amplitude (rad, au) are left out.
const bodies = [
  ["earth", 0],
  ["venus", 1e-6],
  ["mars", 1e-6],
  ["jupiter", 1e-6],
  ["saturn", 1e-6],
  ["uranus", 1e-6],
  ["neptune", 1e-6],
];
const lines = [
  "# VSOP87B: heliocentric longitude L (rad), latitude B (rad) and radius R (au), ecliptic and equinox J2000.",
  "# Bretagnon & Francou 1988, Astronomy and Astrophysics 202:309-315.",
  `# From the npm package astronomia 4.2.0 (MIT licence), SHA-256 ${SHA256}.`,
  "# A line 'body coordinate power' heads the terms a b c: a cos(b + c T) T^power, T in Julian millennia of TDB.",
];
for (const [body, least] of bodies) {
  const source = readFileSync(join(folder, "package", "data", `vsop87B${body}.js`), "utf8");
  const copy = join(folder, `${body}.mjs`);
  writeFileSync(copy, source);
  const series = (await import(pathToFileURL(copy).href)).default;
  for (const coordinate of ["L", "B", "R"]) {
    for (const power of Object.keys(series[coordinate]).sort()) {
      const terms = series[coordinate][power].filter((term) => Math.abs(term[0]) >= least);
      if (terms.length > 0) {
        lines.push(`${body} ${coordinate} ${power}`);
        for (const [a, b, c] of terms) {
          lines.push(`${a} ${b} ${c}`);
        }
      }
    }
  }
}
rmSync(folder, { recursive: true });
writeFileSync(target, lines.join("\n") + "\n");
