#include "rainledger/report/summary.hpp"

#include <algorithm>
#include <sstream>

#include "rainledger/report/version.hpp"
#include "report/sample.hpp"
#include "report/text_table.hpp"
#include "test.hpp"

namespace rainledger {
namespace {

std::string summary_of(const Scenario& scenario, const SiteLedger& ledger,
                       DisplayUnits units = DisplayUnits::metric) {
    const std::vector<SiteLedger> ledgers(scenario.storms.size(), ledger);
    std::string text = summary(scenario, ledgers, {units});
    // The last line names the version; the texts below stand without it.
    const std::string by = "By rainledger " + std::string(version()) + ".\n";
    REQUIRE(text.ends_with(by));
    text.erase(text.size() - by.size());
    return text;
}

std::string summary_of(const Scenario& scenario) {
    return summary_of(scenario, sample::ledger_of_both());
}

Scenario plain() {
    return sample::verge_and_parking(sample::two_steps());
}

/// The summary with one way to lose rain on the verge.
std::string summary_with(const Losses& losses, DisplayUnits units = DisplayUnits::metric) {
    Scenario scenario = plain();
    scenario.site.surfaces[0].losses = losses;
    scenario.site.surfaces[0].interception_mm = 0.0;
    scenario.site.surfaces[0].depression_storage_mm = 0.0;
    return summary_of(scenario, sample::ledger_of_both(), units);
}

std::size_t widest_line(const std::string& text) {
    std::istringstream lines(text);
    std::size_t widest = 0;
    for (std::string line; std::getline(lines, line);)
        widest = std::max(widest, shown_width(line));
    return widest;
}

}  // namespace

TEST_CASE("the summary of two surfaces, in full") {
    CHECK(summary_of(plain()) ==
          R"(Tannery Lane car park

Storm
  12.9 mm of rain in 10 min, at most 150.0 mm/h
  in 2 steps (steps in the scenario)

Where the water went (mm over each area)
                       area                            initial  infil-    left
  surface                m2  losses      rain  run-on     loss  trated  ponded  excess
  ------------------------------------------------------------------------------------
  verge                1600  Green-Ampt  12.9     9.0      1.0     8.2     4.0     8.7
  parking              4800  impervious  12.9     0.0      0.0     0.0     1.5    11.4
  ------------------------------------------------------------------------------------
  whole site, to CB-2  6400              12.9     0.0      0.2     2.1     2.1     8.5

What the excess amounts to
                       excess  volume    runoff   worst 5  worst 10  worst 15  worst 30
  surface                  mm      m3  coeff. *  min, L/s  min, L/s  min, L/s  min, L/s
  -------------------------------------------------------------------------------------
  verge                   8.7    13.8      0.67      46.1      23.1      15.4      7.69
  parking                11.4    54.7      0.88     182        91.2      60.8     30.4
  -------------------------------------------------------------------------------------
  whole site, to CB-2     8.5    54.2      0.66     180        90.3      60.2     30.1
  * volumetric: volume of excess over volume of rain; not the C of the rational method
  Flows are the excess averaged over the worst minutes, before any travel time.
  Excess that runs onto another surface stands in both rows (whose coefficient can
  pass 1); a place and the whole site count it once.

When, in hours and minutes from the start
              ponding  runoff
  surface     time     start   ponded
  ----------------------------------------------------------
  verge       0:06     0:08    0:06 to the end, still ponded
  parking     -        0:05    -
  ----------------------------------------------------------
  whole site  0:06     0:05
  A place ponds and runs off with the first of its surfaces.

  Still ponded at the end: 4.0 mm on verge (6.40 m3), 1.5 mm on parking (7.20 m3)
  The books balance.

Assumptions
  verge: Green-Ampt, conductivity 10.9 mm/h, suction times deficit 22 mm; interception 1 mm;
      depression storage 4 mm, which infiltrates
  parking: impervious; depression storage 1.5 mm; 30 % of its excess runs onto verge

This is an estimate from assumed losses; local codes and a licensed engineer decide.
)");
}

TEST_CASE("the summary of one surface in inches, with clock times, in full") {
    Scenario scenario = sample::verge_and_parking(sample::two_stamped_steps());
    scenario.title.clear();
    scenario.site.surfaces.pop_back();
    SiteLedger ledger = sample::ledger_of_both();
    ledger.surfaces.pop_back();
    CHECK(summary_of(scenario, ledger, DisplayUnits::inches) ==
          R"(Rainfall losses

Storm
  0.51 in of rain in 10 min, at most 5.91 in/h
  in 2 steps (steps in the scenario)
  begins 2026-03-04T23:50:00+01:00

Where the water went (inches over each area)
                        area                            initial  infil-    left
  surface                 ac  losses      rain  run-on     loss  trated  ponded  excess
  -------------------------------------------------------------------------------------
  verge                0.395  Green-Ampt  0.51    0.35     0.04    0.32    0.16    0.34
  -------------------------------------------------------------------------------------
  whole site, to CB-2  1.581              0.51    0.00     0.01    0.08    0.08    0.33

What the excess amounts to
                       excess  volume    runoff     worst 5    worst 10    worst 15    worst 30
  surface                  in     ft3  coeff. *  min, ft3/s  min, ft3/s  min, ft3/s  min, ft3/s
  ---------------------------------------------------------------------------------------------
  verge                  0.34     489      0.67        1.63       0.816       0.544       0.272
  ---------------------------------------------------------------------------------------------
  whole site, to CB-2    0.33    1910      0.66        6.37       3.19        2.13        1.06
  * volumetric: volume of excess over volume of rain; not the C of the rational method
  Flows are the excess averaged over the worst minutes, before any travel time.

When, in hours and minutes from the start (and by the clock)
           ponding       runoff
  surface  time          start         ponded
  --------------------------------------------------------------------------
  verge    0:06 (23:56)  0:08 (23:58)  0:06 (23:56) to the end, still ponded

  Still ponded at the end: 0.16 in on verge (226 ft3)
  The books balance.

Assumptions
  verge: Green-Ampt, conductivity 0.4291 in/h, suction times deficit 0.8661 in;
      interception 0.03937 in; depression storage 0.1575 in, which infiltrates

This is an estimate from assumed losses; local codes and a licensed engineer decide.
)");
}

TEST_CASE("the summary says what was done to the storm") {
    Scenario scenario = sample::verge_and_parking(sample::two_stamped_steps());
    Storm& storm = scenario.storms[0];
    storm.file = "gauge.csv";
    storm.multiply_by = 1.2;
    storm.continued_h = 2.0;
    append_dry_time(storm.rain, 2.0);
    storm.rain.taken_as_dry_h = 0.5;
    storm.rain.clock_assumed = true;
    CHECK_THAT(summary_of(scenario),
               Contains("Storm\n"
                        "  12.9 mm of rain in 10 min, at most 150.0 mm/h\n"
                        "  in 2 steps (file gauge.csv)\n"
                        "  30 min of it without data, taken as dry\n"
                        "  begins 2026-03-04T23:50:00+01:00; the stamps carry no zone, so the "
                        "clock is assumed never to change\n"
                        "  allowance: every depth multiplied by 1.2, already in these figures\n"
                        "  then 2 h 00 min of dry time (continue_for)\n"));
}

TEST_CASE("rain too coarse for the shortest windows says so") {
    Scenario scenario = sample::verge_and_parking(
        make_hyetograph({0.0, 10.0, 20.0, 50.0}, "min", {0.4, 12.5, 3.0}));
    CHECK_THAT(summary_of(scenario),
               Contains("  The heaviest rain is an average over its step of 10 min; over fewer "
                        "minutes the flow\n  may have been higher.\n"));
    scenario = sample::verge_and_parking(
        make_hyetograph({0.0, 10.0, 15.0, 45.0}, "min", {0.4, 12.5, 3.0}));
    CHECK_THAT(summary_of(scenario), !Contains("heaviest"));
}

TEST_CASE("several storms are told apart, the assumptions are said once") {
    Scenario scenario = plain();
    scenario.storms.push_back(scenario.storms[0]);
    scenario.storms[0].name = "gust";
    scenario.storms[1].name = "long";
    const std::string text = summary_of(scenario);
    CHECK_THAT(text, Contains("\nStorm gust (1 of 2)\n") && Contains("\nStorm long (2 of 2)\n"));
    CHECK(text.find("Assumptions") == text.rfind("Assumptions"));
    scenario.storms.pop_back();
    CHECK_THAT(summary_of(scenario), Contains("\nStorm gust\n"));
}

TEST_CASE("several places have a row each, and a run-on below zero is explained") {
    Scenario scenario = plain();
    scenario.site.surfaces[1].drains_to = "swale";
    SiteLedger ledger = sample::ledger_of_both();
    ledger.places.push_back(sample::joint("swale"));
    ledger.places[1].total.run_on_mm = -3.42;
    const std::string text = summary_of(scenario, ledger);
    CHECK_THAT(text, Contains("  to CB-2     6400              12.9     0.0 "));
    CHECK_THAT(text, Contains("  to swale    6400              12.9    -3.4 "));
    CHECK_THAT(text, Contains("  whole site  6400              12.9     0.0 "));
    CHECK_THAT(text, Contains("  Run-on below zero: more is sent to surfaces that drain elsewhere "
                              "than arrives.\n"));
    CHECK_THAT(text, Contains("  parking (to swale): impervious;"));
}

TEST_CASE("books that do not balance say by how much and where") {
    SiteLedger ledger = sample::ledger_of_both();
    ledger.surfaces[1].closure_mm = 0.25;
    CHECK_THAT(summary_of(plain(), ledger),
               Contains("  The books do not balance: they are off by as much as 0.25 mm "
                        "(parking).\n"));
    ledger.surfaces[1].closure_mm = 0.0;
    ledger.site.closure_mm = 2.2e-8;  // just over 1e-9 times the 21.9 mm that reach the verge
    CHECK_THAT(summary_of(plain(), ledger),
               Contains("  The books do not balance: they are off by as much as 2.2e-08 mm (whole "
                        "site).\n"));
    ledger.surfaces[0].closure_mm = sample::kNone;  // no number is worse than any
    CHECK_THAT(summary_of(plain(), ledger), Contains("by as much as nan mm (verge).\n"));
    ledger.surfaces[0].closure_mm = 0.0;
    ledger.site.closure_mm = 2.1e-8;
    CHECK_THAT(summary_of(plain(), ledger), Contains("  The books balance.\n"));
}

TEST_CASE("a surface that never ponds or never runs off says so") {
    Scenario scenario = plain();
    SiteLedger ledger = sample::ledger_of_both();
    ledger.surfaces[0].ponding.clear();
    ledger.surfaces[0].runoff_start_h.reset();
    ledger.surfaces[0].figures.volumetric_runoff_coefficient.reset();
    ledger.surfaces[0].total.ponded_mm = 0.0;
    ledger.surfaces[1].total.ponded_mm = 0.04;
    const std::string text = summary_of(scenario, ledger);
    CHECK_THAT(text, Contains("\n  verge       none     none\n"));
    CHECK_THAT(text, Contains("\n  verge                   8.7    13.8         -  "));
    CHECK_THAT(text, Contains("  Still ponded at the end: under 0.1 mm on parking (0.192 m3)\n"));
    ledger.surfaces[1].total.ponded_mm = 0.0;
    CHECK_THAT(summary_of(scenario, ledger), !Contains("Still ponded"));
}

TEST_CASE("ponded intervals stand three to a line, and of very many the first twelve") {
    Scenario scenario = plain();
    SiteLedger ledger = sample::ledger_of_both();
    ledger.surfaces[0].ponding.clear();
    for (int i = 0; i < 14; ++i)
        ledger.surfaces[0].ponding.push_back({i + 0.0, i + 0.5});
    const std::string text = summary_of(scenario, ledger);
    CHECK_THAT(text,
               Contains("  verge       0:00     0:08    0:00 to 0:30; 1:00 to 1:30; 2:00 to 2:30\n"
                        "                               3:00 to 3:30; "));
    CHECK_THAT(text,
               Contains("11:00 to 11:30\n"
                        "                               and 2 more, 7 h 00 min in all (--json "
                        "lists them)\n"));
}

TEST_CASE("a record that does not begin at zero says where it begins") {
    const Scenario scenario =
        sample::verge_and_parking(make_hyetograph({30.0, 35.0, 40.0}, "min", {0.4, 12.5}));
    CHECK_THAT(summary_of(scenario),
               Contains("When, in hours and minutes of the record, which begins at 0:30\n"));
}

TEST_CASE("the assumptions of every law stand on its line") {
    const HortonCurve curve{50.0, 6.0, 4.14};
    CHECK_THAT(summary_with(Horton{curve, 0.02}),
               Contains("  verge: Horton following infiltrated depth, initial capacity 50 mm/h, "
                        "final 6 mm/h,\n      decay 4.14 1/h, recovery 0.02 1/h\n"));
    CHECK_THAT(summary_with(HortonElapsed{curve}),
               Contains("  verge: Horton following elapsed time, initial capacity 50 mm/h, final 6 "
                        "mm/h, decay 4.14 1/h\n") &&
                   Contains("  Horton, elapsed time  12.9"));
    CHECK_THAT(
        summary_with(GreenAmpt{10.9, 22.0, 60.0, 0.5}),
        Contains("  verge: Green-Ampt, conductivity 10.9 mm/h, suction times deficit 22 mm,\n"
                 "      storage limit 60 mm and then at most 0.5 mm/h\n"));
    CHECK_THAT(summary_with(Philip{12.0, 4.0}),
               Contains("  verge: Philip, sorptivity 12 mm/h^0.5, steady term 4 mm/h\n"));
    CHECK_THAT(summary_with(Philip{12.7, 25.4}, DisplayUnits::inches),
               Contains("  verge: Philip, sorptivity 0.5 in/h^0.5, steady term 1 in/h\n"));
    CHECK_THAT(summary_with(ConstantRate{7.5, 10.0}),
               Contains("  verge: constant rate 7.5 mm/h after an initial loss of 10 mm\n"));
    CHECK_THAT(summary_with(ConstantRate{7.5, 0.0}), Contains("  verge: constant rate 7.5 mm/h\n"));
}

TEST_CASE("a curve number says what it was converted to, and after whom") {
    CHECK_THAT(summary_with(CurveNumber{80.0}),
               Contains("  verge: curve number 80, initial abstraction 0.2 of retention 63.5 mm, "
                        "that is 12.7 mm\n"));
    CHECK_THAT(
        summary_with(CurveNumber{80.0, 0.05, 0.2, AntecedentCondition::III}),
        Contains("  verge: curve number 80 given; 91 for antecedent condition III;\n      88.39 "
                 "from ratio 0.2 to 0.05 (") &&
            Contains("NEH Part 630") && Contains("Hawkins"));
    CHECK_THAT(summary_with(CurveNumber{80.0}), Contains("\n  verge       -        0:08"));
}

TEST_CASE("a phi index says the rate that was matched, storm by storm") {
    Scenario scenario = plain();
    scenario.site.surfaces[0].losses = PhiIndex{8.65};
    SiteLedger ledger = sample::ledger_of_both();
    ledger.surfaces[0].phi_index_mm_per_h = 31.25;
    const std::string text = summary_of(scenario, ledger);
    CHECK_THAT(text, Contains("  Phi index of verge: 31.25 mm/h leaves the observed excess of 8.65 "
                              "mm\n"));
    CHECK_THAT(text, Contains("  verge: phi index for an observed excess of 8.65 mm;"));
}

TEST_CASE("held water is said to be held") {
    Scenario scenario = plain();
    scenario.site.surfaces[0].ponded_water = PondedWater::held;
    const std::string text = summary_of(scenario);
    CHECK_THAT(text, Contains("4.0 mm on verge (6.40 m3, held)"));
    CHECK_THAT(text, Contains("depression storage 4 mm, held\n"));
}

TEST_CASE("columns stay aligned for names of any length and any alphabet") {
    Scenario scenario = plain();
    scenario.site.surfaces[0].name = "Grünstreifen am Weg";
    const std::string text = summary_of(scenario);
    CHECK_THAT(text, Contains("\n  Grünstreifen am Weg  1600  Green-Ampt  12.9 "));
    CHECK_THAT(text, Contains("\n  parking              4800  impervious  12.9 "));
    scenario.site.surfaces[0].name = "verge\nwith a line break";
    CHECK_THAT(summary_of(scenario), Contains("  verge?with a line break  1600 "));
}

TEST_CASE("the summary of a site with ordinary names stays under 100 columns") {
    Scenario scenario = sample::verge_and_parking(sample::two_stamped_steps());
    scenario.site.surfaces[0].losses = HortonElapsed{{50.0, 6.0, 4.14}};
    SiteLedger ledger = sample::ledger_of_both();
    ledger.surfaces[0].ponding = {{30.0, 31.0}};
    CHECK(widest_line(summary_of(scenario, ledger)) < 100);
    CHECK(widest_line(summary_of(scenario, ledger, DisplayUnits::inches)) < 100);
}

}  // namespace rainledger
