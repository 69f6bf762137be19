#include "chart/drawing.hpp"

#include <cmath>
#include <regex>
#include <sstream>
#include <string>
#include <vector>

#include "chart/hyetograph_drawing.hpp"
#include "chart/ledger_drawing.hpp"
#include "chart/loss_view.hpp"
#include "chart/scenes.hpp"
#include "test.hpp"

using namespace rainledger;

namespace {

const ChartUnits kMetric{DisplayUnits::metric};

/// The parts of a script that draw one panel each.
std::vector<std::string> panels_of(const std::string& script) {
    std::vector<std::string> out;
    std::size_t at = script.find("set lmargin");
    while (at != std::string::npos) {
        const std::size_t next = script.find("set lmargin", at + 1);
        out.push_back(script.substr(at, next - at));
        at = next;
    }
    return out;
}

/// Area (units of the vertical axis times hours) of what a panel fills with one ink: half the sum
/// of the cross products along each outline.
double filled(const std::string& panel, std::string_view ink) {
    const std::regex plot(R"(\$d(\d+) using 1:2 with filledcurves closed fillstyle solid 1 )"
                          R"(noborder fillcolor rgb ')" +
                          std::string(ink) + "'");
    double area = 0.0;
    for (std::sregex_iterator i(panel.begin(), panel.end(), plot); i != std::sregex_iterator();
         ++i) {
        const std::string head = "$d" + (*i)[1].str() + " << end\n";
        const std::size_t from = panel.find(head) + head.size();
        std::istringstream rows(panel.substr(from, panel.find("end\n", from) - from));
        std::vector<std::pair<double, double>> outline;
        const auto close = [&] {
            double twice = 0.0;
            for (std::size_t k = 0; k < outline.size(); ++k) {
                const auto& [x0, y0] = outline[k];
                const auto& [x1, y1] = outline[(k + 1) % outline.size()];
                twice += x0 * y1 - x1 * y0;
            }
            area += std::abs(twice) / 2.0;
            outline.clear();
        };
        for (std::string row; std::getline(rows, row);) {
            if (row.empty()) close();
            std::istringstream cells(row);
            double x = 0.0;
            double y = 0.0;
            if (cells >> x >> y) outline.emplace_back(x, y);
        }
        close();
    }
    return area;
}

std::string hyetograph_script(const Scenario& scenario, DisplayUnits units) {
    return hyetograph_drawing(scenario, ChartUnits(units)).script(ChartFormat::svg);
}

std::string ledger_script(const Scenario& scenario) {
    const auto ledgers = scenes::ledgers_of(scenario);
    return ledger_drawing(scenario.title, chosen_losses(scenario, ledgers, {}), kMetric)
        .script(ChartFormat::svg);
}

/// The script with every quoted string taken out.
std::string unquoted(const std::string& script) {
    return std::regex_replace(script, std::regex("'[^'\n]*'"), "");
}

}  // namespace

TEST_CASE("words become strings in which nothing acts") {
    CHECK(quoted("it's") == "'it\u2019s'");
    CHECK(quoted("'; system('evil') #") == "'\u2019; system(\u2019evil\u2019) #'");
    CHECK(quoted("`a` $(b) @c %d \\ {e^f_g} \"h\"") == "'`a` $(b) @c %d \\ {e^f_g} \"h\"'");
    CHECK(quoted("two\nlines\x1b[31m") == "'two?lines?[31m'");
    CHECK(quoted("not \xEF\xBF\xBE in XML \xEF\xBF\xBF") == "'not ? in XML ?'");
    CHECK(quoted("") == "''");
}

TEST_CASE("long words are cut to columns") {
    CHECK(shortened("exactly", 7) == "exactly");
    CHECK(shortened("one too long", 11) == "one too ...");
    CHECK(shortened("雨雨雨雨", 8) == "雨雨雨雨");
    CHECK(shortened("雨雨雨雨雨", 8) == "雨雨...");
    CHECK(columns_used("a雨é") == 4);
}

TEST_CASE("no word of a scenario stands outside a string of the script") {
    Scenario scenario = scenes::one_lawn();
    scenario.title = "evil' ; !evil\n`evil` \"evil\" \\";
    scenario.storms[0].name = "evil'' # evil\\";
    scenario.site.surfaces[0].name = "evil\r$(evil) '";
    for (const std::string& script :
         {hyetograph_script(scenario, DisplayUnits::metric), ledger_script(scenario)}) {
        CHECK(script.find("evil") != std::string::npos);
        CHECK(unquoted(script).find("evil") == std::string::npos);
        CHECK(unquoted(script).find('\'') == std::string::npos);
    }
}

TEST_CASE("columns of a hyetograph hold the depth of their rain") {
    const auto [rain, depth_mm] =
        GENERATE(std::pair{scenes::half_an_hour(), 20.0}, std::pair{scenes::uneven(), 12.4},
                 std::pair{scenes::over_midnight(), 8.0});
    const Scenario scenario = scenes::scenario_of("t", {scenes::storm_of("storm", rain)});
    const auto metric = panels_of(hyetograph_script(scenario, DisplayUnits::metric));
    REQUIRE(metric.size() == 1);
    // Numbers of the script carry seven figures.
    CHECK_THAT(filled(metric[0], kRain), WithinAbs(depth_mm, 1e-4));
    const auto inches = panels_of(hyetograph_script(scenario, DisplayUnits::inches));
    CHECK_THAT(filled(inches[0], kRain), WithinAbs(depth_mm / 25.4, 1e-5));
}

TEST_CASE("dry time appended to a storm is no part of its hyetograph") {
    Scenario scenario = scenes::one_lawn();
    const std::string as_given = hyetograph_script(scenario, DisplayUnits::metric);
    append_dry_time(scenario.storms[0].rain, 2.0);
    CHECK(hyetograph_script(scenario, DisplayUnits::metric) == as_given);
}

TEST_CASE("the strips of a ledger hold its accounts") {
    const Scenario scenario = scenes::one_lawn();
    const Accounts total = scenes::ledgers_of(scenario)[0].surfaces[0].total;
    const auto panels = panels_of(ledger_script(scenario));
    REQUIRE(panels.size() == 4);
    CHECK_THAT(filled(panels[0], kRain), WithinAbs(total.rain_mm, 1e-4));
    CHECK_THAT(filled(panels[1], kInfiltrated), WithinAbs(total.infiltrated_mm, 1e-4));
    CHECK_THAT(filled(panels[1], kInitialLoss), WithinAbs(total.initial_loss_mm, 1e-4));
    CHECK_THAT(filled(panels[1], kExcess), WithinAbs(total.excess_mm, 1e-4));
    const auto ponding = scenes::ledgers_of(scenario)[0].surfaces[0].ponding;
    REQUIRE(ponding.size() == 1);
    CHECK_THAT(filled(panels[2], kInk),
               WithinAbs(ponding[0].end_h.value_or(0.5) - ponding[0].start_h, 1e-6));
}

TEST_CASE("a capacity that does not exist or is unlimited is not drawn") {
    Scenario scenario = scenes::one_lawn();
    CHECK_THAT(ledger_script(scenario), Contains("'capacity'"));
    scenario.site.surfaces[0].interception_mm = 0.0;
    scenario.site.surfaces[0].depression_storage_mm = 0.0;
    scenario.site.surfaces[0].losses = CurveNumber{80.0};
    const std::string script = ledger_script(scenario);
    CHECK_THAT(script, !Contains("'capacity'") && !Contains("nan") && !Contains("inf "));
}

TEST_CASE("a capacity beyond the scale is told in words") {
    Scenario scenario = scenes::one_lawn();
    scenario.site.surfaces[0].losses = ConstantRate{2000.0};
    CHECK_THAT(ledger_script(scenario), Contains("'2000 mm/h or more'"));
}

TEST_CASE("a scale ends a little above what it measures") {
    const Axis axis = scale_axis(88.8, 5);
    CHECK_THAT(axis.to, WithinRel(93.24, 1e-12));
    REQUIRE(axis.ticks.size() == 5);
    CHECK(axis.ticks.back().label == "80");
    const Axis other = matching_axis(69.4, axis);
    CHECK(other.ticks.size() == axis.ticks.size());
    CHECK(other.to >= 69.4);
    CHECK_THAT(other.ticks[1].at / other.to, WithinRel(axis.ticks[1].at / axis.to, 1e-12));
    CHECK(scale_axis(0.0, 4).to >= 1.0);
}
