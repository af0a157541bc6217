import { describe, expect, test } from "vitest";
import * as core from "@/lib/testcards";

const names = [
  ..."convert convertDifference UnitError standardAtmosphere pressureAltitude pressureAltitudeFromQnh densityAltitude hotDayAmbient".split(
    " ",
  ),
  ..."trueAirspeed calibratedAirspeed equivalentAirspeed windFromLegs windComponents correctReading readingFor gaugeAbort".split(" "),
  ..."gaugeRateAbort rateUncertainty combinedUncertainty fitCalibration judge timeBeyond groupSpread peakToPeak largestFall".split(" "),
  ..."worst abortDiscipline hotDayTemperature rate steadySince highest peak testComplete fitApproach heatSoak steadyState".split(" "),
  ..."saturationTemperature saturationPressure heatRejected boilingMargin leakage spread loadingOf insideEnvelope fuelPlan".split(" "),
  ..."climbRateToStandard stallSpeedToMass fuelFlowFactor vibrationOrder intercoolerEffectiveness riskLevel predictNext".split(" "),
  ..."decideStep decideAfterFlight reviewCard reviewSortie restsOn broken layOutSheet debriefModel checkDebrief".split(" "),
];

const exported = new Map<string, unknown>(Object.entries(core));

describe("the core's index", () => {
  test.each(names)("exports %s", (name) => {
    expect(typeof exported.get(name)).toBe("function");
  });
});
