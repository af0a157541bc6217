import { describe, expect, it } from "vitest";
import { must, oneFinding, oneSortieFinding, plain } from "../support/one-finding";
import { climb } from "../support/ready-card";

describe("gauges and entry tolerances", () => {
  it("finds a gauge whose calibration ran out before the planned date, at the card and at the sortie", () => {
    const found = oneFinding("gauge-not-calibrated", [climb()], ({ card }) => {
      must(card.programme.instruments.find((i) => i.id === "OAT")?.calibration).validUntil = "2031-05-02";
    });
    expect(plain(found)).toBe(
      "OAT has a calibration valid until 2031-05-02, before the planned date 2031-05-05. Calibrate it or drop the reading (Point 1, oat).",
    );
    expect(found[0]?.where).toEqual({ at: "instrument", instrument: "OAT" });
    oneSortieFinding("gauge-not-calibrated", [climb()], ({ card }) => {
      must(card.programme.instruments.find((i) => i.id === "OAT")).calibration = null;
    });
  });

  it("takes the last valid day as valid, and the sortie's own day at the sortie", () => {
    oneSortieFinding("gauge-not-calibrated", [climb()], ({ card, sortie }) => {
      must(card.programme.instruments.find((i) => i.id === "OAT")?.calibration).validUntil = "2031-05-05";
      sortie.plannedOn = "2031-05-06";
    });
  });

  it("finds a sensor moved since its calibration", () => {
    const spoil = ({ card }: { card: import("@/lib/testcards/card").CardDocument }) => {
      must(card.programme.instruments.find((i) => i.id === "CHT-PANEL")?.calibration).disturbedOn = "2031-04-20";
    };
    oneFinding("sensor-moved", [climb()], spoil);
    oneSortieFinding("sensor-moved", [climb()], spoil);
  });

  it("finds an entry tolerance finer than the gauge can show", () => {
    const found = oneFinding("entry-finer-than-gauge", [climb()], ({ point }) => {
      const entry = must(point.entry[0]);
      entry.instrument = "ASI-SPARE"; // marks 5, readable 2.5
      entry.tolerance = 1;
    });
    expect(plain(found)).toBe(
      "Point 1: the entry tolerance IAS ±1 kt is finer than ASI-SPARE can show, marked every 5 kt and readable to 2.5 kt. Widen it or change the gauge.",
    );
  });

  it("finds an entry tolerance finer than twice the resolution or than U", () => {
    oneFinding("entry-finer-than-uncertainty", [climb()], ({ point }) => {
      must(point.entry[0]).tolerance = 1.5; // readable 1, twice is 2
    });
    oneFinding("entry-finer-than-uncertainty", [climb()], ({ point, card }) => {
      must(card.programme.instruments.find((i) => i.id === "ASI")?.calibration).expandedUncertainty = 3;
      must(point.entry[0]).tolerance = 2;
    });
  });
});
