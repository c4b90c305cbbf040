import type { TimeCause } from "../cause.ts";
import { coarseModel } from "./coarse-model.ts";
import { embCentre } from "./emb-centre.ts";
import { halfDay } from "./half-day.ts";
import { julianCalendar } from "./julian-calendar.ts";
import { kindSwapped } from "./kind-swapped.ts";
import { lightTime } from "./light-time.ts";
import { monthDaySwapped } from "./month-day-swapped.ts";
import { scaleTt } from "./scale-tt.ts";
import { ssbCentre } from "./ssb-centre.ts";
import { wholeDays } from "./whole-days.ts";
import { yearCopied } from "./year-copied.ts";
import { zone } from "./zone.ts";

/** Gives all causes of wrong times, but for rounding, which is a habit of lists. */
export function allTimeCauses(): readonly TimeCause[] {
  return [
    scaleTt,
    zone,
    halfDay,
    wholeDays,
    embCentre,
    ssbCentre,
    kindSwapped,
    yearCopied,
    monthDaySwapped,
    julianCalendar,
    lightTime,
    coarseModel,
  ];
}
