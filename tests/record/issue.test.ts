// Issues of a job: frozen, numbered, compared with the one before.
import { existsSync, readdirSync, readFileSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { describe, expect, test } from "vitest";
import { readRegister } from "../../kernel/record/register.ts";
import { hingebook, jobFolder, recordOf, rewrite } from "./command.ts";

const issue = (folder: string, rev: string, ...more: readonly string[]): ReturnType<typeof hingebook> =>
  hingebook(
    folder,
    "issue",
    "frame.ipynb",
    "--rev",
    rev,
    "--why",
    `reason of ${rev}`,
    "--date",
    "2031-04-30",
    ...more,
  );

describe("hingebook issue", () => {
  const job = jobFolder();
  const issued = (file: string): string => join(job, "issued", file);

  test("writes the frozen file and the register; names, date and reason stand in the file", async () => {
    const { code, out, err } = issue(job, "P1", "--checked", "K. Ume", "--approved", "S. Darr");
    expect(err).toBe("");
    expect(code).toBe(0);
    expect(out).toMatch(/issued: .*, revision P1, 2031-04-30/);
    expect(readdirSync(join(job, "issued")).sort()).toEqual(["frame-P1.html", "register.json"]);
    const { head, issue: mark, since } = recordOf(issued("frame-P1.html"));
    expect(head).toMatchObject({
      revision: "P1",
      date: "2031-04-30",
      checkedBy: "K. Ume",
      checkedOn: "2031-04-30",
      approvedBy: "S. Darr",
      approvedOn: "2031-04-30",
    });
    expect(mark).toEqual({ revision: "P1", why: "reason of P1", number: 1, follows: "0".repeat(64) });
    expect(since).toBeUndefined();
    const html = readFileSync(issued("frame-P1.html"), "utf8");
    expect(html).toContain("First issue: there is none before it");
    expect(html).toContain("reason of P1");
    expect((await readRegister(issued("register.json"))).rows).toHaveLength(1);
  });

  test("the same revision again is refused and leaves the file as it is", () => {
    const before = readFileSync(issued("frame-P1.html"));
    const { code, err } = issue(job, "P1");
    expect(code).toBe(1);
    expect(err).toMatch(/was issued as P1 on 2031-04-30 .*never overwritten/);
    expect(readFileSync(issued("frame-P1.html")).equals(before)).toBe(true);
  });

  test("the next revision supersedes it, says what changed, and warns of a check that fails", async () => {
    rewrite(job, (source) =>
      source.replace('"6.3 kN/m"', '"7.4 kN/m"').replace("<= 0.10*abs(M_F)", "<= 0.0001*abs(M_F)"),
    );
    const { code, out } = issue(job, "P2");
    expect(code).toBe(0);
    expect(out).toMatch(/WARNING: 1 of its checks DO NOT HOLD/);
    expect(out).toMatch(/supersedes P1 of 2031-04-30/);
    const { rows } = await readRegister(issued("register.json"));
    expect(
      rows.map(({ revision, state, supersededBy, failedChecks }) => [
        revision,
        state,
        supersededBy,
        failedChecks,
      ]),
    ).toEqual([
      ["P1", "superseded", "P2", 0],
      ["P2", "current", undefined, 1],
    ]);
    expect(rows[1]?.follows).toBe(rows[0]?.digest);
    const html = readFileSync(issued("frame-P2.html"), "utf8");
    expect(html).toContain("ISSUED WITH one check that does NOT HOLD");
    expect(html).toContain("What changed since revision P1");
    const section = html.split("What changed since revision P1")[1]?.split("</section>")[0] ?? "";
    // a table is one line, however many of its numbers changed
    expect(section).toMatch(/Internal forces under G \+ S.*<td>\d+ of \d+<\/td>/);
    expect(section.match(/<tr>/g)?.length).toBeLessThan(40);
    const { since } = recordOf(issued("frame-P2.html"));
    expect(since?.revision).toBe("P1");
    expect(since?.changes.grounds.map(({ id, value }) => [id, value?.before, value?.after])).toEqual([
      ["s", "6.30 kN/m", "7.40 kN/m"],
    ]);
  });

  test("a date before that of the issue it supersedes is refused, and nothing is written", () => {
    const before = readdirSync(join(job, "issued")).sort();
    const words = ["frame.ipynb", "--rev", "P3", "--why", "late", "--date", "2031-04-29"] as const;
    const { code, err } = hingebook(job, "issue", ...words);
    expect(code).toBe(1);
    expect(err).toMatch(
      /P3 would be dated 2031-04-29, before P2 of 2031-04-30, which it supersedes; give --date 2031-04-30 or a later one/,
    );
    expect(readdirSync(join(job, "issued")).sort()).toEqual(before);
  });

  test("nothing changed since the issue before: a warning", () => {
    const same = jobFolder();
    expect(issue(same, "P1").out).not.toContain("WARNING");
    const { code, out } = issue(same, "P2");
    expect(code).toBe(0);
    expect(out).toMatch(/supersedes P1 of 2031-04-30\n {2}WARNING: nothing changed since P1/);
    expect(readFileSync(join(same, "issued/frame-P2.html"), "utf8")).toContain(
      "Nothing changed since revision P1",
    );
  });

  test("nothing is issued from a notebook that stops, and the register stays", () => {
    const register = readFileSync(issued("register.json"));
    rewrite(job, (source) => source.replace("span: L,", 'span: "14 kN",'));
    const { code, err } = issue(job, "P3");
    expect(code).toBe(1);
    expect(err).toMatch(/is not a length/);
    expect(err).toMatch(/NOT ISSUED/);
    expect(existsSync(issued("frame-P3.html"))).toBe(false);
    expect(readFileSync(issued("register.json")).equals(register)).toBe(true);
    rewrite(job, (source) => source.replace('span: "14 kN",', "span: L,"));
  });

  test("an altered earlier issue, an altered register and a file in the way are each refused", () => {
    const kept = readFileSync(issued("frame-P2.html"));
    const register = readFileSync(issued("register.json"), "utf8");
    writeFileSync(issued("frame-P2.html"), kept.toString().replace("Boat shed", "Boat shop"));
    expect(issue(job, "P3").err).toMatch(/frame-P2\.html is not the file that was issued as P2/);
    writeFileSync(issued("frame-P2.html"), kept);
    writeFileSync(issued("register.json"), register.replace("reason of P1", "another reason"));
    expect(issue(job, "P3").err).toMatch(/row 1 \(frame\.ipynb, P1\) was changed after it was written/);
    writeFileSync(issued("register.json"), register);
    writeFileSync(issued("frame-P3.html"), "in the way");
    expect(issue(job, "P3").err).toMatch(/frame-P3\.html is there but not in the register/);
    expect(readFileSync(issued("frame-P3.html"), "utf8")).toBe("in the way");
  });

  test.each([
    [["issue", "frame.ipynb", "--why", "x"], /issue needs --rev/],
    [["issue", "frame.ipynb", "--rev", "P1"], /issue needs --why/],
    [["issue", "--rev", "P1", "--why", "x"], /issue needs one notebook/],
    [["issue", "frame.ipynb", "--rev", "../P1", "--why", "x"], /"\.\.\/P1" cannot be a revision/],
    [
      ["issue", "frame.ipynb", "--rev", "P1", "--why", "x", "--date", "2031-02-30"],
      /"2031-02-30" is no date/,
    ],
    [["issue", "frame.ipynb", "--rev", "P1", "--why", "x", "--chekced", "K"], /did you mean "--checked"/],
    [["verify"], /verify needs a package/],
    [["changes", "a.html"], /changes needs two packages/],
  ])("%j is not understood: exit code 2", (words, message) => {
    const { code, err } = hingebook(job, ...words);
    expect(err).toMatch(message);
    expect(code).toBe(2);
  });
});

describe("hingebook run --sensitivity", () => {
  test("lists what each valued assumption moves, worked out by running again", () => {
    const job = jobFolder();
    const { code, out } = hingebook(job, "run", "frame.ipynb", "--sensitivity");
    expect(code).toBe(0);
    expect(out).toMatch(/r_I \+10 %: 2 results move/);
    const { moves = [] } = recordOf(join(job, "out/frame.html"));
    expect(moves.map(({ assumption }) => assumption)).toEqual(["hinge h1 (G + S)", "r_I"]);
    const [hinge, ratio] = moves;
    // w = 10.9 kN/m, L = 12.6 m, both hinges at x = 1.1 * 0.115 L from the knees: M_B = -w x (L - x)/2.
    const x = 1.1 * 0.115 * 12.6;
    const knee = hinge?.results.find(({ id }) => id === "M_B");
    expect(knee?.value.si).toBeCloseTo((-10.9e3 * x * (12.6 - x)) / 2, 3);
    expect(hinge?.results.map(({ id }) => id)).toEqual(["M_B", "M_m", "H_A"]);
    // k = r_I h/L, M_F = -wL²/(4(2k + 3))
    const k = (1.1 * 2.5 * 4.8) / 12.6;
    expect(ratio?.results.map(({ id }) => id)).toEqual(["k", "M_F"]);
    expect(ratio?.results[1]?.value.si).toBeCloseTo((-10.9e3 * 12.6 ** 2) / (4 * (2 * k + 3)), 3);
    expect(ratio?.results[0]?.share).toBeCloseTo(0.1, 9);
    expect(readFileSync(join(job, "out/frame.html"), "utf8")).toContain("What each assumption moves");
  });
});

describe("hingebook run FOLDER", () => {
  test("leaves an index with status, last issue, governing results and open queries", () => {
    const job = jobFolder();
    expect(issue(job, "P1").code).toBe(0);
    writeFileSync(
      join(job, "broken.ipynb"),
      readFileSync(join(job, "frame.ipynb"), "utf8").replace("span: L,", 'span: \\"3 kN\\",'),
    );
    const { code, out } = hingebook(job, "run", ".");
    expect(code).toBe(1);
    expect(out).toMatch(/index: out\/index\.html/);
    const index = readFileSync(join(job, "out/index.html"), "utf8");
    expect(index).toContain('href="frame.html"');
    expect(index).toContain('href="../issued/frame-P1.html"');
    expect(index).toContain("12 of 12 hold");
    expect(index).toContain("−88.1\u00a0kN·m");
    expect(index).toContain('href="broken.INCOMPLETE.html"');
    expect(index).toMatch(/INCOMPLETE<\/strong>/);
  });
});
