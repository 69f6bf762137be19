#include <algorithm>
#include <sstream>

#include "rainledger/report/fit_report.hpp"
#include "rainledger/report/version.hpp"
#include "report/fit_samples.hpp"
#include "report/text_table.hpp"
#include "test.hpp"

namespace rainledger {
namespace {

using sample::halved;
using sample::shown_of;

std::string summary_of(const ShownFit& shown, DisplayUnits units = DisplayUnits::metric) {
    const std::string text = fit_summary(shown, {units});
    const std::string end =
        std::string(kFitCaution) + "\nBy rainledger " + std::string(version()) + ".\n";
    REQUIRE(text.ends_with(end));
    return text.substr(0, text.size() - end.size());
}

/// Text with every run of blanks and line breaks as one blank.
std::string flowing(const std::string& text) {
    std::istringstream words(text);
    std::string out;
    for (std::string word; words >> word;)
        out += (out.empty() ? "" : " ") + word;
    return out;
}

}  // namespace

TEST_CASE("the summary of one pit, in full") {
    CHECK(summary_of(shown_of({sample::good_pit()})) == R"(Quarry Row, pit 3
  readings from pit3.csv
  12 readings of cumulative depth in 2 h 00 min: 83.0 mm infiltrated, at 30.4 mm/h in the end

Readings
            to  in the interval  so far   rate
  reading  min               mm      mm   mm/h
  --------------------------------------------
        1    5              9.1     9.1  109.2
        2   10              6.5    15.6   78.0
        3   15              5.6    21.2   67.2
        4   20              4.7    25.9   56.4
        5   30              7.9    33.8   47.4
        6   40              6.8    40.6   40.8
        7   50              5.9    46.5   35.4
        8   60              5.6    52.1   33.6
        9   75              8.0    60.1   32.0
       10   90              7.8    67.9   31.2
       11  105              7.5    75.4   30.0
       12  120              7.6    83.0   30.4

Steady rate
  last three rates within 10 %: steady from reading 9 (60 min) on, 30.9 mm/h, mean of 4 readings
      (95 % interval 29.5 to 32.3)
  less than 10 % change in an hour: not steady, the rate still changed by 15 % within the last
      hour
  The test is steady by one convention and not by the other: take its final rate with care.
  Without the last 3 readings Horton's final capacity would be 31.9 mm/h in place of 30.7 mm/h.

Laws, ranked by AICc
                                                                   AICc
                                                            RMSE  above
                                    fitted   95 % interval    mm   best      R2  lag-1
  ------------------------------------------------------------------------------------
  Horton                                                    0.18    0.0  0.9999   0.28
    initial capacity (mm/h)        116          112 to 119
    final capacity (mm/h)           30.7      30.2 to 31.3
    decay (1/h)                      3.92     3.66 to 4.18
  Kostiakov                                                 0.51   19.9  0.9995   0.49
    depth at 1 h (mm)               52.3      51.9 to 52.7
    exponent                         0.658  0.644 to 0.671
  modified Kostiakov                                        0.51   24.6  0.9995   0.49
    depth at 1 h (mm)               52.3      51.9 to 52.7
    exponent                         0.658  0.644 to 0.671
    steady term (mm/h)               0        on its bound
  Philip                                                    0.89   33.3  0.9985   0.57
    sorptivity (mm/h^0.5)           34.3      31.5 to 37.1
    steady term (mm/h)              17.4      14.9 to 19.8
  Green-Ampt                                                0.95   34.8  0.9983   0.58
    effective conductivity (mm/h)   22.4      19.5 to 25.2
    suction-deficit product (mm)    28.0      20.2 to 35.9
  Nonlinear least squares on cumulative depth; 95 % intervals by the delta method; RMSE and R2 on
  cumulative depth; lag-1: correlation of neighbouring residuals. Laws less than 2 apart in AICc
  fit equally well, and one more than 10 above the best has little for it; with few readings it
  prefers few parameters (common practice).

Horton by the straight line of ln(f - fc) on time, beside the fit
                            initial  final  decay  RMSE  rates  left   R2 of
                               mm/h   mm/h    1/h    mm   used   out    line
  --------------------------------------------------------------------------
  nonlinear fit               115.9   30.7   3.92  0.18     12
  line on interval ends       129.9   30.9   3.71  4.21     10     2  0.9944
    less the fit               14.0    0.2  -0.21  4.02
  line on interval middles    118.0   30.9   3.97  0.46     10     2  0.9956
    less the fit                2.1    0.2   0.05  0.27
  The straight line is biased: its logarithms give the rates near the final one, which are mostly
  error, the most weight, and rates at or below it are left out. Take the fit.

Warnings
  - modified Kostiakov: the steady term ended on its bound, 0; the free fit would be negative, so
    these readings do not tell a steady rate.
  - Philip: neighbouring residuals are correlated (0.57): the intervals are too narrow, and the
    law may not suit the soil.
  - Green-Ampt: neighbouring residuals are correlated (0.58): the intervals are too narrow, and
    the law may not suit the soil.

Before using these values
  - The test describes a small area under ponded water; soils vary from pit to pit more than one
    pit tells.
  - Water that spreads sideways below the ring makes rates too high, most below a single one.
  - Digging and driving disturb the soil: smeared walls slow the water, gaps along the ring let it
    through.
  - Warm water infiltrates faster, by 2 to 3 % for each degree Celsius: set rates of a warm day
    against the season of design.
  - No allowance is made for clogging, compaction or the spread of the soil: that is the
    engineer's.

)");
}

TEST_CASE("a test that stopped too early is told in words") {
    const std::string text = flowing(summary_of(shown_of({sample::short_pit()})));
    CHECK_THAT(text, Contains("6 readings of drops of the water in 15 min: 24.1 mm infiltrated, at "
                              "62.0 mm/h in the end"));
    CHECK_THAT(text, Contains("last three rates within 10 %: not steady, they differ by 34 % of "
                              "their mean"));
    CHECK_THAT(text, Contains("less than 10 % change in an hour: cannot be told, the test is too "
                              "short for it"));
    CHECK_THAT(text, Contains("The test was still falling when it stopped: every final rate fitted "
                              "to it is an extrapolation."));
    CHECK_THAT(text, Contains("- the test stopped too early: "));
    CHECK_THAT(text, Contains("Nonlinear least squares on interval depths"));
}

TEST_CASE("rates that rise and rates that scatter are told from rates that fall") {
    const auto words = [](const std::vector<double>& depths) {
        return flowing(summary_of(
            shown_of({test_of(ReadingKind::infiltrated, {10, 20, 30, 40, 50}, depths)})));
    };
    CHECK_THAT(words({10.0, 16.0, 20.0, 25.0, 31.0}),
               Contains("The test was rising when it stopped"));
    CHECK_THAT(words({10.0, 16.0, 22.0, 25.0, 31.0}),
               Contains("The test was not steady when it stopped, its last rates go up and down"));
}

TEST_CASE("two conventions that agree need no care") {
    const std::string text = flowing(summary_of(shown_of({sample::horton_pit({60.0, 30.0, 9.0})})));
    CHECK_THAT(text, Contains("The test ran until it was steady"));
    CHECK_THAT(text, !Contains("take its final rate with care"));
}

TEST_CASE("a final capacity that is held says from where") {
    FieldFitOptions options;
    options.steady_use = SteadyUse::fixed;
    options.fixed_rate_mm_per_h = 25.0;
    const std::string fixed = flowing(summary_of(shown_of({sample::good_pit()}, options)));
    CHECK_THAT(fixed, Contains("Horton's final capacity is held at 25.0 mm/h, as given."));
    CHECK_THAT(fixed, Contains("final capacity (mm/h) 25.0 held"));
    options.steady_use = SteadyUse::tail;
    // The mean of the last four rates, 32.0, 31.2, 30.0 and 30.4 mm/h.
    CHECK_THAT(flowing(summary_of(shown_of({sample::good_pit()}, options))),
               Contains("Horton's final capacity is held at the test's tail, 30.9 mm/h, mean of 4 "
                        "readings"));
}

TEST_CASE("rates for design stand beside the fitted ones, divided as asked") {
    const std::string text =
        flowing(summary_of(shown_of({sample::horton_pit({100.0, 30.0, 4.0})}, halved())));
    CHECK_THAT(text, Contains("initial capacity (mm/h) 100 100 to 100 50.0 "));
    CHECK_THAT(text, Contains("final capacity (mm/h) 30.0 30.0 to 30.0 15.0 "));
    CHECK_THAT(text, Contains("decay (1/h) 4.00 4.00 to 4.00 4.00 "));
    CHECK_THAT(text, Contains("For design, rates are divided by 2 as asked"));
    CHECK_THAT(text,
               Contains("Rates for design are divided by 2 as asked; whether that is enough"));
    CHECK_THAT(flowing(summary_of(shown_of({sample::good_pit()}))), !Contains("divided"));
}

TEST_CASE("in inches 101.6 mm/h is 4 in/h") {
    const std::string text = flowing(
        summary_of(shown_of({sample::horton_pit({101.6, 25.4, 4.0})}), DisplayUnits::inches));
    CHECK_THAT(text, Contains("initial capacity (in/h) 4.00 4.00 to 4.00"));
    CHECK_THAT(text, Contains("final capacity (in/h) 1.00 1.00 to 1.00"));
    CHECK_THAT(text, Contains("nonlinear fit 4.00 1.00 4.00 0.000 12"));
    CHECK_THAT(text, !Contains("(mm"));
}

TEST_CASE("several pits are fitted together, and their spread is told") {
    const ShownFit shown = shown_of({sample::horton_pit({80.0, 20.0, 4.0}, "A"),
                                     sample::horton_pit({100.0, 30.0, 4.0}, "B"),
                                     sample::horton_pit({120.0, 40.0, 4.0}, "C")});
    const std::string text = flowing(summary_of(shown));
    CHECK_THAT(text, Contains("All pits together 36 readings in 3 pits ranked first in the pits, "
                              "each fitted alone: Horton in 3 of 3"));
    // Means, ends and sample deviations of the curves the readings were made of.
    CHECK_THAT(text, Contains("initial capacity (mm/h) 100 80.0 120 20.0 "
                              "final capacity (mm/h) 30.0 20.0 40.0 10.0 decay (1/h) 4.00 4.00 "
                              "4.00 0"));
    CHECK_THAT(text, Contains("The spread between the pits, not the interval of the fit to all of "
                              "them, is the uncertainty of the site."));
    for (const char* pit : {"Pit A 12 readings", "Pit B 12 readings", "Pit C 12 readings"})
        CHECK_THAT(text, Contains(pit));
}

TEST_CASE("of many readings the first and the last are shown") {
    std::vector<double> minutes;
    std::vector<double> depths;
    for (int i = 1; i <= 40; ++i) {
        minutes.push_back(3.0 * i);
        depths.push_back(horton_cumulative({90.0, 20.0, 3.0}, 0.05 * i));
    }
    const std::string text =
        summary_of(shown_of({test_of(ReadingKind::infiltrated, minutes, depths)}));
    CHECK_THAT(text, Contains("\n        6   18 ") && Contains("\n      ...\n") &&
                         Contains("\n       35  105 ") && Contains("\n       40  120 "));
    CHECK_THAT(text, !Contains("\n        7   21 ") && !Contains("\n       34  102 "));
}

TEST_CASE("readings left out keep their numbers") {
    FieldFitOptions options;
    options.ignore_first_h = 0.1;
    const std::string text = summary_of(shown_of({sample::good_pit()}, options));
    CHECK_THAT(text, Contains("  without the first 2 readings, as asked: depths count from 10 min "
                              "on\n"));
    CHECK_THAT(text, Contains("\n        3   15              5.6     5.6  67.2\n"));
}

TEST_CASE("no law, and no line, are said with their reasons") {
    const std::string text = flowing(summary_of(shown_of({sample::dry_pit()})));
    CHECK_THAT(text, Contains("Laws No law could be fitted."));
    CHECK_THAT(text, Contains("- Horton could not be fitted: nothing has infiltrated."));
    CHECK_THAT(text, Contains("On interval ends there is no line: "));
    CHECK_THAT(text, !Contains("The straight line is biased"));
}

TEST_CASE("an unlimited parameter says so") {
    CHECK_THAT(flowing(summary_of(shown_of({sample::root_pit()}))),
               Contains("effective conductivity (mm/h) 0 on its bound suction-deficit product (mm) "
                        "- unlimited"));
}

TEST_CASE("a single ring has a caution of its own") {
    ShownFit shown = shown_of({sample::good_pit()});
    CHECK_THAT(summary_of(shown), !Contains("This test had a single ring"));
    shown.single_ring = true;
    CHECK_THAT(summary_of(shown), Contains("This test had a single ring: water spreads sideways"));
}

TEST_CASE("names cannot move the cursor") {
    ShownFit shown = shown_of({sample::good_pit("a\x1b[31m"), sample::slow_pit("b\r")});
    shown.title = "\x1b[2Jtitle";
    shown.readings = "x\n.csv";
    const std::string text = summary_of(shown);
    CHECK(text.starts_with("?[2Jtitle\n  readings from x?.csv\n"));
    CHECK(text.find('\x1b') == std::string::npos);
    CHECK(text.find('\r') == std::string::npos);
}

TEST_CASE("no line of the summary is wider than a hundred columns or ends in a blank") {
    const auto scaled = [](double factor) {
        std::vector<double> depths;
        for (const TestReading& reading : sample::good_pit().readings)
            depths.push_back(factor * reading.depth_mm);
        return test_of(ReadingKind::infiltrated, sample::kPitMinutes, depths);
    };
    const ShownFit tests[]{shown_of({sample::good_pit()}, halved()),
                           shown_of({scaled(100.0)}, halved()),
                           shown_of({scaled(0.001)}, halved()),
                           shown_of({sample::short_pit()}, halved()),
                           shown_of({sample::dry_pit()}),
                           shown_of({sample::root_pit()}, halved()),
                           sample::three_pits(halved())};
    for (const ShownFit& shown : tests)
        for (const DisplayUnits units : {DisplayUnits::metric, DisplayUnits::inches}) {
            const std::string text = fit_summary(shown, {units});
            INFO(text);
            std::istringstream lines(text);
            std::size_t widest = 0;
            for (std::string line; std::getline(lines, line);)
                widest = std::max(widest, shown_width(line));
            CHECK(widest <= 100);
            CHECK(text.find(" \n") == std::string::npos);
        }
}

}  // namespace rainledger
