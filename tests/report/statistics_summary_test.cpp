#include <sstream>

#include "rainledger/report/storm_summary.hpp"
#include "report/text_table.hpp"
#include "test.hpp"

namespace rainledger {
namespace {

RainfallStatistics two_columns() {
    RainfallStatistics table;
    table.duration_h = {5.0 / 60.0, 0.5, 24.0};
    table.return_period_yr = {2.0, 10.0};
    table.depth_mm = {8.2, 12.5, 21.4, 32.5, 58.1, 88.0};
    return table;
}

ColumnFit fitted_column() {
    ColumnFit column{10.0, {{5.0 / 60.0, 0.5, 24.0}, {12.5, 32.5, 88.0}}, {}};
    const IntensityFormula by_m{2453.64, 13.9, 0.97, 1.0, 1.0 / 60.0};
    column.fits.push_back(
        {FormulaFit{FormulaForm::free_m, by_m, {-0.0125, 0.02, 0.001}, 0.0123}, {}});
    column.fits.push_back({std::nullopt, "the depths rise too fast"});
    return column;
}

}  // namespace

TEST_CASE("a table of statistics with a fitted formula, in full") {
    const std::vector<ColumnFit> fits{fitted_column()};
    const std::string text =
        statistics_summary("Rainfall statistics of county.csv", two_columns(), fits, {});
    CHECK(text.substr(0, text.find("By rainledger")) ==
          R"(Rainfall statistics of county.csv

Depth of rain in mm by duration and return period
  duration  2 yr  10 yr
  ---------------------
  5 min      8.2   12.5
  30 min    21.4   32.5
  24 h      58.1   88.0

Formula i = a / (t^m + b)^n fitted to the depths of 10 yr
            table  n = 1, m fitted
  duration   mm/h         off by %
  --------------------------------
  5 min     150.0             -1.2
  30 min     65.0              2.0
  24 h        3.7              0.1
  n = 1, m fitted: off by 1.23 % in the root mean square
    formula: {a: 2453.64 mm/h, b: 13.9, m: 0.97, n: 1, time: min}
  No fit: the depths rise too fast

  Fitted by least squares on log intensity, t in minutes. A line as above goes into
  a scenario under 'design:'; it holds between the durations of the table.

Rain figures are estimates from past records; local codes and a licensed engineer decide.
)");
}

TEST_CASE("in inches the formula's line is in inches too") {
    const std::vector<ColumnFit> fits{fitted_column()};
    CHECK_THAT(statistics_summary("x", two_columns(), fits, {DisplayUnits::inches}),
               Contains("formula: {a: 96.6 in/h, b: 13.9, m: 0.97, n: 1, time: min}\n") &&
                   Contains("Depth of rain in inches by duration"));
}

TEST_CASE("a list without return periods is one column of depths") {
    RainfallStatistics list;
    list.duration_h = {0.25, 1.0};
    list.depth_mm = {23.5, 41.0};
    CHECK_THAT(statistics_summary("x", list, {}, {}), Contains("Depth of rain in mm by duration\n"
                                                               "  duration  depth\n"
                                                               "  ---------------\n"
                                                               "  15 min     23.5\n"
                                                               "  1 h        41.0\n"));
}

TEST_CASE("what a table holds besides is told, and a wide table is cut to the page") {
    RainfallStatistics wide;
    wide.duration_h = {1.0};
    for (int i = 1; i <= 13; ++i) {
        wide.return_period_yr.push_back(100.0 * i);
        wide.depth_mm.push_back(100.0 + i);
    }
    wide.set_aside = {"lower confidence limits, from line 30", "upper ones"};
    const std::string text = statistics_summary("x", wide, {}, {});
    CHECK_THAT(text, Contains("  duration  1100 yr  1200 yr  1300 yr\n") &&
                         Contains("  Not used: lower confidence limits, from line 30\n"
                                  "  Not used: upper ones\n"));
    std::istringstream lines(text);
    for (std::string line; std::getline(lines, line);)
        CHECK(shown_width(line) <= 100);
}

}  // namespace rainledger
