import { describe, expect, it } from "vitest";
import { must, oneFinding, plain } from "../support/one-finding";
import { climb, readingOf, shut, soak, stepOf } from "../support/ready-card";

describe("what a point must say", () => {
  it("finds a missing recovery", () => {
    oneFinding("recovery-missing", [climb()], ({ point }) => {
      point.recovery = " ";
    });
  });

  it("finds a stop point that is not the last of its card", () => {
    const found = oneFinding(
      "stop-point-not-last",
      [climb({ id: "ground", place: "ground", order: "G2" }), soak({ place: "ground" })],
      ({ card }) => {
        card.content.points.push(climb());
      },
    );
    expect(plain(found)).toBe("Point 2 stops the engine and is not last on its card of 3 points. Move it to the end or to its own card.");
  });

  it("finds more than six hand-written numbers a set, the time counted, and sets closer than 60 s", () => {
    // Seven cells in a row do not fit the paper either.
    const found = oneFinding(["sheet-overflow", "too-many-numbers"], [climb()], ({ point }) => {
      point.readings.push(readingOf("oil-p")); // six readings and the time column
    });
    expect(plain(found.slice(1))).toBe("Point 1 asks the pilot for 7 hand-written numbers a set, more than 6. Give some to the recorder.");
    oneFinding("too-many-numbers", [shut()], ({ point }) => {
      must(point.grid).rows = ["0:00", "0:30", "1:00"];
    });
  });

  it("finds a minimum height missing from a COWL SHUT point and from a stall", () => {
    const found = oneFinding("height-floor-missing", [shut()], ({ point }) => {
      point.heightFloor = null;
    });
    expect(plain(found)).toBe("Point 1 takes COWL SHUT in the air and has no minimum height. Add it.");
    oneFinding("height-floor-missing", [climb({ needsHeightFloor: true })], ({ point }) => {
      point.heightFloor = null;
    });
  });

  it("finds more than seven steps, and a step over 60 characters", () => {
    oneFinding("step-too-long", [climb()], ({ point }) => {
      must(point.steps[2]).text = "level at 11 000 ft in any case and then turn back towards the strip"; // 67
    });
    oneFinding("step-too-long", [soak()], ({ point }) => {
      for (const id of ["d", "e", "f", "g", "h"]) point.steps.push(stepOf(id, "log"));
    });
  });

  it("finds a vague word without a number and lets one with a number pass", () => {
    const found = oneFinding("vague-word", [climb()], ({ point }) => {
      must(point.steps[2]).text = "level at 11 000 ft";
      point.recovery = "COWL OPEN, level, power as required";
    });
    expect(plain(found)).toContain('"as required" stands without a number. Give the number.');
  });

  it("finds a reading that feeds no check and a limit that has no reading", () => {
    oneFinding("reading-unused", [climb()], ({ point }) => {
      point.readings.push(readingOf("volts", { unit: "V", onSheet: "none", recordedBy: "recorder" }));
    });
    oneFinding("reading-unused", [climb()], ({ point }) => {
      point.limits = [
        {
          id: "x",
          reading: "gone",
          label: "Catch tank",
          side: "max",
          value: 150,
          unit: "mL",
          forS: 0,
          statistic: "instant",
          expandedUncertainty: 10,
          source: "PL-01 rev 2",
        },
      ];
    });
  });

  it("finds a safety parameter without an expected band", () => {
    const found = oneFinding("expected-missing", [climb()], ({ point }) => {
      must(point.readings[1]).expected = null;
    });
    expect(plain(found)).toBe("Point 1: coolant has no expected band. Predict it.");
  });

  it("finds a soak that reads coolant only", () => {
    const found = oneFinding("soak-one-sensor", [soak()], ({ point }) => {
      point.readings = point.readings.slice(0, 1);
      point.aborts.lines = point.aborts.lines.slice(0, 1);
    });
    expect(plain(found)).toContain("reads coolant only, and the pump stands still then. Add head metal and skin.");
  });
});

describe("power, climb and stop", () => {
  it("finds rpm above continuous held past its allowance", () => {
    const found = oneFinding("power-held-too-long", [climb()], ({ point }) => {
      must(point.steps[0]).durationS = 301; // 5 min = 300 s
    });
    expect(plain(found)).toContain("2700 rpm is held 301 s; 2580 rpm may be passed for 300 s. Shorten it.");
  });

  it("adds up steps that follow one another above continuous, and refuses power above full", () => {
    oneFinding("power-held-too-long", [climb()], ({ point }) => {
      point.steps.unshift(stepOf("z", "2650/29.5 for 5 min", { kind: "power", durationS: 250, rpm: 2650, manifoldPressureInHg: 28 }));
    });
    oneFinding("power-held-too-long", [climb()], ({ point }) => {
      must(point.steps[0]).rpm = 2740; // above 2730, which may never be passed
    });
  });

  it("finds a climb that ends below the critical altitude or before 5 min past the peak", () => {
    const found = oneFinding("climb-too-short", [climb()], ({ point }) => {
      point.steps = [must(point.steps[0]), stepOf("b", "2550/28.5 to 5 min past highest"), stepOf("c", "level at 8 000 ft")];
    });
    expect(plain(found)).toContain("is planned to end at 8000 ft, below the critical altitude 9000 ft. Lengthen it.");
    oneFinding("climb-too-short", [climb()], ({ point }) => {
      must(point.steps[1]).text = "2550/28.5 to 3 min past highest, above 9000 ft";
    });
  });

  it("finds an engine stop without a timed cool-down", () => {
    const found = oneFinding("cool-down-missing", [soak()], ({ point }) => {
      must(point.steps[0]).durationS = 120;
    });
    expect(plain(found)).toBe(
      "Point 1 has a cool-down of 120 s, less than 180 s, before its engine stop. Add 3 min at 1000 rpm before it.",
    );
    oneFinding("cool-down-missing", [soak()], ({ point }) => {
      point.steps = point.steps.slice(1);
    });
  });
});

describe("speeds and controls", () => {
  const at = (kt: number) => [
    climb({
      positions: [{ control: "COWL", position: "TRAIL" }],
      entry: [{ id: "e", parameter: "ias", instrument: "ASI", relation: "about", value: kt, tolerance: 2, unit: "kt" }],
    }),
  ];

  it("finds a speed beyond V_NE, the tolerance counted, and beyond V_FE with the wing flap out", () => {
    const found = oneFinding("speed-past-limit", at(110), ({ point }) => {
      must(point.entry[0]).value = 137;
      point.smoothAir = true;
    });
    expect(plain(found)).toContain("reaches 139 kt, beyond V_NE 138 kt. Lower it.");
    oneFinding("speed-past-limit", [climb({ wingFlap: true })], ({ point }) => {
      must(point.entry[0]).value = 79; // 79 + 2 > 80
    });
  });

  it("finds a speed beyond V_NO without smooth air", () => {
    oneFinding("smooth-air-missing", at(110), ({ point }) => {
      must(point.entry[0]).value = 114; // 116 > 115
    });
  });

  it("finds COWL OPEN above its own speed, and reads a bound in words as a bound", () => {
    const found = oneFinding("cowl-open-overspeed", [climb()], ({ point }) => {
      must(point.entry[0]).value = 104; // 106 > 105
    });
    expect(plain(found)).toContain("COWL OPEN at 104 kt ±2 reaches 106 kt, above its 105 kt. Lower the speed or use TRAIL.");
    oneFinding("cowl-open-overspeed", [climb()], ({ point }) => {
      must(point.steps[2]).text = "level at 11 000 ft, 110 KIAS";
    });
  });

  it("finds a running point without a COWL position, and a ground position in the air", () => {
    const found = oneFinding("cowl-position-missing", [climb()], ({ point }) => {
      point.positions = [];
    });
    expect(plain(found)).toBe(
      "Point 1 states no COWL position. Write SHUT, TRAIL or OPEN first in the entry line (REMOVED on the ground only).",
    );
    oneFinding("cowl-position-missing", [climb()], ({ point }) => {
      point.positions = [{ control: "COWL", position: "REMOVED" }];
    });
  });

  it("finds a COWL SHUT point at power whose recovery does not start with COWL OPEN", () => {
    const found = oneFinding("cowl-shut-no-opening", [shut()], ({ point }) => {
      point.recovery = "45 %, 80 kt, then COWL OPEN";
    });
    expect(plain(found)).toContain("does not start with COWL OPEN. Put it first.");
  });

  it("finds the bare word flap, and lets COWL FLAP and WING FLAP pass", () => {
    const found = oneFinding("flap-word-ambiguous", [climb()], ({ point }) => {
      point.recovery = "COWL OPEN, level, flap up, 80 kt";
    });
    expect(plain(found)).toContain("Write COWL or WING FLAP.");
    oneFinding("flap-word-ambiguous", [climb({ recovery: "COWL exit flap open, WING FLAP up" })], ({ card }) => {
      card.programme.thenLine.air = "flap open, call";
    });
  });
});
