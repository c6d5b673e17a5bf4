import { spawnSync } from "node:child_process";
import { mkdirSync, mkdtempSync, rmSync, symlinkSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { dirname, join } from "node:path";

const root = join(__dirname, "..", "..");
const configFile = join(root, ".dependency-cruiser.cjs");

/** Each rule with a file that breaks it. The files import one another by the alias-free paths the project uses. */
const seeded: Record<string, { file: string; source: string; needs?: string[] }> = {
  "shared-sees-shared": {
    file: "shared/music/a.ts",
    source: 'import "../../server/http/http";',
    needs: ["server/http/http.ts"],
  },
  "engine-packages": { file: "shared/music/b.ts", source: 'import { z } from "zod"; export const b = z;' },
  "contract-packages": { file: "shared/contract/c.ts", source: 'import { Note } from "tonal"; export const c = Note;' },
  "engine-without-contract": {
    file: "shared/music/d.ts",
    source: 'import "../contract/plain";',
    needs: ["shared/contract/plain.ts"],
  },
  "engine-layer-signal": {
    file: "shared/signal/e.ts",
    source: 'import "../music/plain";',
    needs: ["shared/music/plain.ts"],
  },
  "engine-layer-music": {
    file: "shared/music/f.ts",
    source: 'import "../songs/plain";',
    needs: ["shared/songs/plain.ts"],
  },
  "engine-layer-voice": {
    file: "shared/voice/g.ts",
    source: 'import "../songs/plain";',
    needs: ["shared/songs/plain.ts"],
  },
  "engine-layer-songs": {
    file: "shared/songs/h.ts",
    source: 'import "../keys/plain";',
    needs: ["shared/keys/plain.ts"],
  },
  "engine-layer-keys": { file: "shared/keys/i.ts", source: 'import "../ways/plain";', needs: ["shared/ways/plain.ts"] },
  "engine-layer-instruments": {
    file: "shared/instruments/j.ts",
    source: 'import "../ways/plain";',
    needs: ["shared/ways/plain.ts"],
  },
  "engine-layer-ways": {
    file: "shared/ways/k.ts",
    source: 'import "../contract/plain";',
    needs: ["shared/contract/plain.ts"],
  },
  "engine-layer-sheets": {
    file: "shared/sheets/k.ts",
    source: 'import "../contract/plain";',
    needs: ["shared/contract/plain.ts"],
  },
  "engine-layer-coach": {
    file: "shared/coach/k.ts",
    source: 'import "../contract/plain";',
    needs: ["shared/contract/plain.ts"],
  },
  "ui-sees-shared": {
    file: "features/ui/l.ts",
    source: 'import "../songs/plain";',
    needs: ["features/songs/plain.ts"],
  },
  "api-sees-shared": {
    file: "features/api/m.ts",
    source: 'import "../songs/plain";',
    needs: ["features/songs/plain.ts"],
  },
  "span-sees-ui": {
    file: "features/span/n.ts",
    source: 'import "../songs/plain";',
    needs: ["features/songs/plain.ts"],
  },
  "features-stay-apart": {
    file: "features/voice/o.ts",
    source: 'import "../songs/plain";',
    needs: ["features/songs/plain.ts"],
  },
  "app-composes-features": {
    file: "app/p.ts",
    source: 'import "../server/http/http";',
    needs: ["server/http/http.ts"],
  },
  "server-sees-shared": {
    file: "server/songs/q.ts",
    source: 'import "../../features/songs/plain";',
    needs: ["features/songs/plain.ts"],
  },
  "server-domains-meet-at-services": {
    file: "server/songs/r.ts",
    source: 'import "../voices/voice.router";',
    needs: ["server/voices/voice.router.ts"],
  },
  "http-knows-no-domain": {
    file: "server/http/s.ts",
    source: 'import "../voices/voice.service";',
    needs: ["server/voices/voice.service.ts"],
  },
  "no-cycle": { file: "shared/songs/t.ts", source: 'import "./u";', needs: [] },
};

interface Violation {
  from: string;
  rule: { name: string };
}

function cruise(files: Record<string, string>): Violation[] {
  const place = mkdtempSync(join(tmpdir(), "house-"));
  try {
    for (const [file, source] of Object.entries(files)) {
      mkdirSync(join(place, dirname(file)), { recursive: true });
      writeFileSync(join(place, file), source);
    }
    writeFileSync(
      join(place, "package.json"),
      JSON.stringify({ name: "seeded", dependencies: { zod: "*", tonal: "*" } }),
    );
    writeFileSync(join(place, "tsconfig.json"), "{}");
    symlinkSync(join(root, "node_modules"), join(place, "node_modules"));
    const run = spawnSync(
      process.execPath,
      [
        join(root, "node_modules/dependency-cruiser/bin/dependency-cruise.mjs"),
        "--config",
        configFile,
        "--output-type",
        "json",
        ...["app", "features", "server", "shared"].filter((top) =>
          Object.keys(files).some((file) => file.startsWith(`${top}/`)),
        ),
      ],
      { cwd: place, encoding: "utf8", maxBuffer: 1 << 26 },
    );
    if (!run.stdout) throw new Error(run.stderr);
    return (JSON.parse(run.stdout) as { summary: { violations: Violation[] } }).summary.violations;
  } finally {
    rmSync(place, { recursive: true, force: true });
  }
}

describe("the dependency rules", () => {
  const files: Record<string, string> = { "shared/songs/u.ts": 'import "./t";' };
  for (const { file, source, needs = [] } of Object.values(seeded)) {
    files[file] = source;
    for (const needed of needs) files[needed] ??= "export const plain = 1;";
  }
  const violations = cruise(files);

  test("name one seeded violation each", () => {
    const { forbidden } = jest.requireActual<{ forbidden: { name: string }[] }>(configFile);
    expect(Object.keys(seeded).sort()).toEqual(forbidden.map((rule) => rule.name).sort());
  });

  test.each(Object.entries(seeded))("%s fails on its seeded violation", (name, { file }) => {
    expect(violations.filter((violation) => violation.from === file).map((violation) => violation.rule.name)).toContain(
      name,
    );
  });

  test("say nothing about imports that the house allows", () => {
    const allowed = {
      "shared/music/a.ts": 'import { Note } from "tonal"; export const a = Note;',
      "shared/voice/b.ts": 'import { a } from "../music/a"; export const b = a;',
      "shared/contract/c.ts": 'import { z } from "zod"; export const c = z;',
      "features/ui/d.ts": 'import { b } from "../../shared/voice/b"; export const d = b;',
      "features/songs/e.ts": 'import { d } from "../ui/d"; export const e = d;',
      "app/f.ts": 'import { e } from "../features/songs/e"; export const f = e;',
      "server/voices/voice.service.ts": 'import { c } from "../../shared/contract/c"; export const g = c;',
      "server/songs/song.service.ts": 'import { g } from "../voices/voice.service"; export const h = g;',
    };
    expect(cruise(allowed)).toEqual([]);
  });
});
