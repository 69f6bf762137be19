#include "rainledger/chart/fit_chart.hpp"

#include <cmath>
#include <limits>
#include <sstream>

#include "chart/fit_marks.hpp"
#include "chart/fit_view.hpp"
#include "chart/scenes.hpp"
#include "folder.hpp"
#include "report/fit_samples.hpp"
#include "test.hpp"

namespace rainledger {
namespace {

using sample::shown_of;

std::string chart_of(const ShownFit& shown, ChartFormat format,
                     DisplayUnits units = DisplayUnits::metric) {
    const Chart chart = fit_chart(shown, {format, units});
    INFO(chart.problem);
    REQUIRE(chart.bytes);
    CHECK(chart.problem.empty());
    return *chart.bytes;
}

std::size_t count_of(const std::string& text, const std::string& part) {
    std::size_t count = 0;
    for (std::size_t at = text.find(part); at != std::string::npos;
         at = text.find(part, at + part.size()))
        ++count;
    return count;
}

const ChartUnits kMetric(DisplayUnits::metric);

}  // namespace

TEST_CASE("each format of a field test's chart begins as its files do") {
    const ShownFit shown = shown_of({sample::good_pit()});
    const std::string svg = chart_of(shown, ChartFormat::svg);
    CHECK(svg.starts_with("<?xml"));
    CHECK_THAT(svg,
               Contains("<title>Quarry Row, pit 3</title>") &&
                   Contains("12 readings over 2 h; Horton ranks first by AICc, RMSE 0.18 mm") &&
                   Contains("rate [mm/h]") && Contains("infiltrated so far [mm]") &&
                   Contains("read less fitted depth [mm]") && Contains("time [h:min]"));
    for (const FieldLaw law : kFieldLaws)
        CHECK_THAT(svg, Contains("<text>" + std::string(field_law_name(law)) + "</text>"));
    CHECK_THAT(svg, Contains("<text>readings</text>") && Contains(std::string(kFitCaution)));
    CHECK(chart_of(shown, ChartFormat::png).starts_with("\x89PNG\r\n"));
    CHECK(chart_of(shown, ChartFormat::pdf).starts_with("%PDF-"));
    CHECK(chart_of(shown, ChartFormat::svg) == svg);
}

TEST_CASE("several pits are named, and the residuals are those of the law that ranks first") {
    const std::string svg = chart_of(sample::three_pits(), ChartFormat::svg);
    for (const char* pit : {"north", "middle", "south"})
        CHECK_THAT(svg, Contains("<text>" + std::string(pit) + "</text>"));
    CHECK_THAT(svg, Contains("36 readings in 3 pits") &&
                        Contains("read less fitted depth, Kostiakov [mm]"));
}

TEST_CASE("of very many pits the key names the first") {
    std::vector<InfiltrationTest> tests;
    for (int i = 1; i <= 20; ++i)
        tests.push_back(sample::good_pit("pit " + std::to_string(i)));
    const std::string svg = chart_of(shown_of(tests), ChartFormat::svg);
    CHECK_THAT(svg, Contains("<text>pit 16</text>") && !Contains("<text>pit 17</text>") &&
                        Contains("<text>and 4 more</text>"));
}

TEST_CASE("rates that are to be divided for design are drawn as read, and this is said") {
    FieldFitOptions options;
    options.design_factor = 2.0;
    const ShownFit shown = shown_of({sample::good_pit()}, options);
    CHECK_THAT(chart_of(shown, ChartFormat::svg),
               Contains("rate as read, not divided by 2 for design [mm/h]"));
    CHECK(fit_view(shown, kMetric, 9).marks.front().rate_mm_per_h ==
          fit_view(shown_of({sample::good_pit()}), kMetric, 9).marks.front().rate_mm_per_h);
}

TEST_CASE("a chart in inches measures in inches") {
    CHECK_THAT(chart_of(shown_of({sample::good_pit()}), ChartFormat::svg, DisplayUnits::inches),
               Contains("rate [in/h]") && Contains("infiltrated so far [in]") &&
                   Contains("RMSE 0.007 in"));
}

TEST_CASE("a chart in text shows every reading three times, within a hundred columns") {
    for (const auto& shown : {shown_of({sample::good_pit()}), shown_of({sample::short_pit()}),
                              shown_of({sample::dry_pit()}), sample::three_pits()}) {
        const std::string text = chart_of(shown, ChartFormat::text);
        INFO(text);
        std::istringstream lines(text);
        for (std::string line; std::getline(lines, line);)
            CHECK(columns_used(line) <= 100);
        CHECK(text.find(" \n") == std::string::npos);
        CHECK(text.ends_with("\n"));
    }
    const std::string text = chart_of(shown_of({sample::good_pit()}), ChartFormat::text);
    CHECK(count_of(text, "●") == 3 * 12 + 1);  // and once in the key
    CHECK_THAT(text, Contains("\n· Horton, RMSE 0.18 mm\n  Kostiakov, RMSE 0.51 mm\n"));
    CHECK_THAT(chart_of(sample::three_pits(), ChartFormat::text),
               Contains("\nA north\nB middle\nC south\n· Kostiakov"));
}

TEST_CASE("a reading in text stands at its time and depth") {
    // 40 mm after 2 h of 4, of 80 mm: half across and half up a panel of twelve rows.
    const auto test = test_of(ReadingKind::infiltrated, {60, 120, 240}, {20.0, 40.0, 80.0});
    FieldFitOptions options;
    options.laws = {FieldLaw::kostiakov};
    const std::string text = chart_of(shown_of({test}, options), ChartFormat::text);
    const std::string depths = text.substr(text.find("infiltrated so far"));
    std::istringstream lines(depths);
    std::vector<std::string> rows;
    for (std::string row; std::getline(lines, row);)
        rows.push_back(row);
    CHECK(rows[1].starts_with("    80 ┤"));
    CHECK(rows[7].starts_with("    40 ┤"));
    const std::size_t at = rows[7].find("●");
    REQUIRE(at != std::string::npos);
    CHECK(columns_used(rows[7].substr(0, at)) == 8 + 45);
}

TEST_CASE("titles and names of a field test are drawn and never run") {
    const testing::Folder folder;
    const std::string touch = "touch " + folder.path("run");
    for (const std::string& name :
         {"`" + touch + "`", "'; system('" + touch + "'); '", "\"; !" + touch + "\n!" + touch,
          std::string("\\"), std::string("@x #{/Bold y} %s ^2 & <b> ]]>"),
          std::string("\xff\xfe \x1b[31m"), std::string(5000, 'W')}) {
        ShownFit shown = shown_of({sample::good_pit(name), sample::slow_pit("b")});
        shown.title = name;
        for (const ChartFormat format : {ChartFormat::svg, ChartFormat::png, ChartFormat::text})
            CHECK(!chart_of(shown, format).empty());
    }
    CHECK(folder.names().empty());
}

TEST_CASE("tests of one reading, without infiltration and of absurd size are drawn") {
    for (const auto& test :
         {test_of(ReadingKind::infiltrated, {10}, {5.0}), sample::dry_pit(), sample::root_pit(),
          test_of(ReadingKind::infiltrated, {1, 2, 3}, {1e-9, 2e-9, 2.5e-9}),
          test_of(ReadingKind::infiltrated, {1e5, 2e5, 3e5}, {1e9, 2e9, 2.5e9})})
        for (const ChartFormat format : {ChartFormat::svg, ChartFormat::text})
            CHECK(!chart_of(shown_of({test}), format).empty());
}

TEST_CASE("without gnuplot a field test is drawn as text alone") {
    const testing::Folder empty;
    const scenes::SearchPath path(empty.path());
    const ShownFit shown = shown_of({sample::good_pit()});
    const Chart chart = fit_chart(shown, {});
    CHECK(!chart.bytes);
    CHECK(chart.problem == "gnuplot is not installed");
    CHECK(fit_chart(shown, {ChartFormat::text, DisplayUnits::metric}).bytes);
}

TEST_CASE("a curve is read between its points") {
    const double unlimited = std::numeric_limits<double>::infinity();
    const std::vector<CurvePoint> curve{{0.5, 0.0, unlimited}, {1.0, 10.0, 8.0}, {2.0, 16.0, 4.0}};
    CHECK(curve_depth_mm(curve, 0.1) == 0.0);
    CHECK(curve_depth_mm(curve, 0.75) == 5.0);
    CHECK(curve_depth_mm(curve, 1.0) == 10.0);
    CHECK(curve_depth_mm(curve, 1.5) == 13.0);
    CHECK(curve_depth_mm(curve, 3.0) == 16.0);
    CHECK(std::isinf(curve_rate_mm_per_h(curve, 0.5)));
    CHECK(std::isinf(curve_rate_mm_per_h(curve, 0.75)));
    CHECK(curve_rate_mm_per_h(curve, 1.5) == 6.0);
}

TEST_CASE("depths of a pit that begins later stand on the curve of all") {
    FieldFitOptions options;
    options.ignore_first_h = 0.1;
    // One pit's first interval ends at 6 min, the other's at 10: 10 mm at 100 mm/h by then.
    const auto early = test_of(ReadingKind::infiltrated, {6, 30, 60, 90}, {10, 50, 100, 150}, "a");
    const auto late = test_of(ReadingKind::infiltrated, {10, 30, 60, 90}, {20, 50, 100, 150}, "b");
    const FitView view = fit_view(shown_of({early, late}, options), kMetric, 9);
    REQUIRE(view.marks.size() == 6);
    CHECK_THAT(view.marks[2].depth_mm, WithinAbs(140.0, 1e-9));
    CHECK_THAT(view.marks[5].depth_mm, WithinAbs(130.0 + 20.0 / 3.0, 2.5));
}

TEST_CASE("marks keep their size whatever the axes measure, and shapes change from pit to pit") {
    Panel panel;
    panel.box = {0.0, 200.0, 0.0, 100.0};
    panel.x = {0.0, 2.0, {}, true};
    panel.y = {0.0, 50.0, {}, true};
    const PanelPoint point{1.0, 20.0};
    const auto disc = marks({&point, 1}, 0, panel);
    REQUIRE(disc.size() == 2);
    std::istringstream rows(disc[1].rows);
    double x = 0.0;
    double y = 0.0;
    int corners = 0;
    while (rows >> x >> y) {
        ++corners;
        CHECK_THAT(std::hypot((x - 1.0) * 100.0, (y - 20.0) * 2.0), WithinRel(kMarkRadius, 1e-4));
    }
    CHECK(corners == 21);
    CHECK(marks({&point, 1}, 1, panel)[1].rows != disc[1].rows);
    CHECK(marks({&point, 1}, 5, panel)[1].rows == disc[1].rows);
    CHECK(marks({&point, 1}, 5, panel).size() == 3);
}

}  // namespace rainledger
