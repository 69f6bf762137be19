#include "rainledger/report/storm_summary.hpp"

#include "rainledger/report/summary.hpp"
#include "rainledger/report/version.hpp"
#include "report/storm_samples.hpp"
#include "test.hpp"

namespace rainledger {
namespace {

std::string without_version(std::string text) {
    const std::string by = "By rainledger " + std::string(version()) + ".\n";
    REQUIRE(text.ends_with(by));
    text.erase(text.size() - by.size());
    return text;
}

std::string summary_of(const Storm& storm, DisplayUnits units = DisplayUnits::metric) {
    Scenario scenario;
    scenario.title = "Tannery Lane";
    scenario.storms = {storm};
    return without_version(storm_summary(scenario, {units}));
}

}  // namespace

TEST_CASE("the summary of a design storm, in full") {
    CHECK(summary_of(sample::design_storm()) ==
          R"(Tannery Lane

Storm
  21.0 mm of rain in 15 min, at most 150.0 mm/h
  in 3 steps
  design storm: alternating blocks over 15 min in steps of 5 min, peak at 0.5 of it (assumed);
      from county_rain.csv, return period 10 yr

Heaviest rain
  within    mm   mm/h
  -------------------
  5 min   12.5  150.0
  10 min  19.0  114.0
  15 min  21.0   84.0
  30 min  21.0   42.0
  60 min  21.0   21.0

Depths by duration, of the statistics and of the storm (mm)
  duration  statistic  storm
  --------------------------
  5 min          12.5   12.5
  10 min         19.0   19.0
  15 min         21.0   21.0
  The storm holds the depth of every duration listed.

Rain figures are estimates from past records; local codes and a licensed engineer decide.
)");
}

TEST_CASE("the summary of an event in inches, in full") {
    CHECK(summary_of(sample::event_storm(), DisplayUnits::inches) ==
          R"(Tannery Lane

Storm 2026-03-04 23:50
  0.51 in of rain in 10 min, at most 5.91 in/h
  in 2 steps
  event 2 of 7 in the record logger.csv
  0.40 in in the five days before it
  begins 2026-03-04T23:50:00+01:00, ends 2026-03-05T00:00:00+01:00

Heaviest rain
  within    in  in/h
  ------------------
  5 min   0.49  5.91
  10 min  0.51  3.05
  15 min  0.51  2.03
  30 min  0.51  1.02
  60 min  0.51  0.51

How rare the event was
  duration    in  return period
  --------------------------------
  5 min     0.52  about 14 yr
  10 min    1.14  more than 100 yr
  15 min    0.47  less than 2 yr
  Rarest over 10 min: more than 100 yr.

Rain figures are estimates from past records; local codes and a licensed engineer decide.
)");
}

TEST_CASE("a window shorter than the heaviest step is marked as its mean") {
    const std::string text =
        summary_of(sample::storm_of(make_hyetograph({0.0, 10.0, 70.0}, "min", {6.0, 3.0})));
    CHECK_THAT(text, Contains("  5 min *  3.0  36.0\n") && Contains("  10 min   6.0  36.0\n") &&
                         Contains("  60 min   8.5   8.5\n") &&
                         Contains("  * less than the step of 10 min: the mean of the step, not a "
                                  "peak\n") &&
                         Contains("  in 2 steps (steps in the scenario)\n"));
}

TEST_CASE("a duration that the storm does not hold is named") {
    Storm storm = sample::design_storm();
    std::get<DesignOrigin>(storm.origin).held[1].storm_mm = 18.0;
    CHECK_THAT(summary_of(storm), Contains("  10 min         19.0   18.0\n") &&
                                      Contains("  The storm does not hold the depth of: 10 min\n"));
}

TEST_CASE("an allowance and new steps are kept apart from the design") {
    Storm storm = sample::design_storm();
    storm.resampled = ResampledFrom{0.25, 150.0, 84.0};
    CHECK_THAT(summary_of(storm),
               Contains("  brought to steps of 15 min: the peak falls from 150.0 to 84.0 mm/h, by "
                        "44 %\n") &&
                   Contains("(mm), before the new steps\n"));
    storm.multiply_by = 1.2;
    CHECK_THAT(summary_of(storm), Contains("by 44 %,\n      before the allowance\n") &&
                                      Contains("  allowance: every depth multiplied by 1.2") &&
                                      Contains("(mm), before the allowance and new steps\n"));
    storm.resampled = ResampledFrom{5.0 / 60.0, 150.0, 150.0};
    CHECK_THAT(summary_of(storm),
               Contains("  brought to steps of 5 min: the peak does not change\n"));
}

TEST_CASE("rain between two instants, and a record that begins too late, are said") {
    Storm storm = sample::event_storm();
    auto& origin = std::get<EventOrigin>(storm.origin);
    origin.event.number = 0;
    origin.event.antecedent_known = false;
    origin.rarity.reset();
    const std::string text = summary_of(storm);
    CHECK_THAT(text,
               Contains("  all rain of the record logger.csv between two given instants\n"
                        "  10.2 mm in the five days before it, of which the record does not hold "
                        "the whole\n") &&
                   !Contains("How rare"));
}

TEST_CASE("an event that was rare over no duration is said to be so") {
    Storm storm = sample::event_storm();
    std::get<EventOrigin>(storm.origin).rarity =
        EventRarity{{{5.0 / 60.0, 4.0, {{}, {}, 2.0}}, {1.0, 9.0, {{}, {}, 2.0}}}, 0};
    CHECK_THAT(summary_of(storm), Contains("  1 h       9.0  less than 2 yr\n"
                                           "  Over no duration as rare as 2 yr.\n"));
}

TEST_CASE("a mass curve is named with its source") {
    Storm storm = sample::design_storm();
    auto& origin = std::get<DesignOrigin>(storm.origin);
    origin.pattern = StormPattern::mass_curve;
    origin.peak_at.reset();
    origin.curve_words = "NRCS type II (a source)";
    origin.held.clear();
    CHECK_THAT(summary_of(storm),
               Contains("  design storm: mass curve over 15 min in steps of 5 min; NRCS type II (a "
                        "source);\n      from county_rain.csv, return period 10 yr\n") &&
                   !Contains("Depths by duration"));
}

TEST_CASE("the summary of losses says where a storm comes from") {
    Scenario scenario = sample::verge_and_parking(sample::two_steps());
    scenario.storms = {sample::design_storm(), sample::event_storm()};
    scenario.storms[1].resampled = ResampledFrom{0.25, 150.0, 84.0};
    const std::vector<SiteLedger> ledgers(2, sample::ledger_of_both());
    const std::string text = summary(scenario, ledgers);
    CHECK_THAT(text, Contains("  in 3 steps\n  design storm: alternating blocks over 15 min") &&
                         Contains("\nStorm 2026-03-04 23:50 (2 of 2)\n") &&
                         Contains("  event 2 of 7 in the record logger.csv\n") &&
                         Contains("  10.2 mm in the five days before it\n  brought to steps of "));
}

TEST_CASE("several storms are told one after the other, and hidden characters shown as '?'") {
    Scenario scenario;
    scenario.storms = {sample::design_storm(), sample::design_storm()};
    scenario.storms[1].name = "10\x1b[2Jyear";
    const std::string text = storm_summary(scenario, {});
    CHECK(text.starts_with("Storms\n\nStorm (1 of 2)\n"));
    CHECK_THAT(text, Contains("\nStorm 10?[2Jyear (2 of 2)\n"));
}

}  // namespace rainledger
