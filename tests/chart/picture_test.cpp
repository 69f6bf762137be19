#include <filesystem>
#include <string>

#include "chart/gnuplot.hpp"
#include "chart/scenes.hpp"
#include "folder.hpp"
#include "rainledger/chart/chart.hpp"
#include "rainledger/report/caution.hpp"
#include "test.hpp"

using namespace rainledger;

namespace {

std::string losses(const Scenario& scenario, ChartFormat format, const ChartChoice& choice = {}) {
    const auto ledgers = scenes::ledgers_of(scenario);
    const Chart chart = losses_chart(scenario, ledgers, choice, {format, DisplayUnits::metric});
    INFO(chart.problem);
    REQUIRE(chart.bytes);
    CHECK(chart.problem.empty());
    return *chart.bytes;
}

std::string hyetograph(const Scenario& scenario, ChartFormat format) {
    const Chart chart = hyetograph_chart(scenario, {format, DisplayUnits::metric});
    INFO(chart.problem);
    REQUIRE(chart.bytes);
    return *chart.bytes;
}

/// A stand-in for gnuplot: a shell script in a folder of its own.
void stand_in(const testing::Folder& folder, const std::string& commands) {
    namespace fs = std::filesystem;
    const std::string path = folder.write("gnuplot", "#!/bin/sh\nPATH=/usr/bin:/bin\n" + commands);
    fs::permissions(path, fs::perms::owner_all);
}

}  // namespace

TEST_CASE("the ending of a file names the format") {
    CHECK(chart_format("a.svg") == ChartFormat::svg);
    CHECK(chart_format("b/a.PNG") == ChartFormat::png);
    CHECK(chart_format("a.b.pdf") == ChartFormat::pdf);
    CHECK(chart_format("a.txt") == ChartFormat::text);
    CHECK(chart_format("-") == ChartFormat::text);
    for (const char* other : {"", "svg", "a.jpg", "a.svg.gz", "a"})
        CHECK(!chart_format(other));
}

TEST_CASE("each format begins as its files do") {
    const Scenario scenario = scenes::one_lawn();
    for (const auto& draw :
         {hyetograph(scenario, ChartFormat::svg), losses(scenario, ChartFormat::svg)}) {
        CHECK(draw.starts_with("<?xml"));
        CHECK_THAT(draw, Contains("<svg") && Contains("viewBox=\"0 0 640 ") &&
                             Contains("<title>A lawn at Quarry Row</title>"));
        CHECK_THAT(draw, !Contains("Bold\"") && !Contains("gnuplot_plot_1</title>"));
        CHECK(draw.find("</svg>") != std::string::npos);
    }
    CHECK(hyetograph(scenario, ChartFormat::png).starts_with("\x89PNG\r\n"));
    CHECK(losses(scenario, ChartFormat::png).starts_with("\x89PNG\r\n"));
    CHECK(hyetograph(scenario, ChartFormat::pdf).starts_with("%PDF-"));
    CHECK(losses(scenario, ChartFormat::pdf).starts_with("%PDF-"));
}

TEST_CASE("the same scenario gives the same SVG to the last byte") {
    const Scenario scenario =
        scenes::scenario_of("Tannery Lane", {scenes::storm_of("storm", scenes::over_midnight())},
                            {scenes::lawn(), scenes::roof()});
    CHECK(losses(scenario, ChartFormat::svg) == losses(scenario, ChartFormat::svg));
    CHECK(hyetograph(scenario, ChartFormat::svg) == hyetograph(scenario, ChartFormat::svg));
}

TEST_CASE("titles and names are drawn and never run") {
    const testing::Folder folder;
    const std::string touch = "touch " + folder.path("run");
    Scenario scenario = scenes::scenario_of(
        "`" + touch + "` it's", {scenes::storm_of("$(" + touch + ")", scenes::half_an_hour())});
    const std::vector<std::string> titles{
        "`" + touch + "`",
        "'; system('" + touch + "'); '",
        "\"; !" + touch + "\n!" + touch + "\nset output '" + folder.path("run") + "'\n",
        "\\",
        "`",
        "@x #{/Bold y} %s ^2 _3 & <b> ]]> |" + touch,
        "\xff\xfe not UTF-8 \x1b[31m",
        "",
        std::string(5000, 'W'),
    };
    for (const std::string& title : titles) {
        scenario.title = title;
        scenario.site.surfaces[0].name = title;
        for (const ChartFormat format : {ChartFormat::svg, ChartFormat::png, ChartFormat::text}) {
            CHECK(!losses(scenario, format).empty());
            CHECK(!hyetograph(scenario, format).empty());
        }
    }
    CHECK(folder.names().empty());
}

TEST_CASE("words stand in an SVG as they were given, as XML writes them") {
    Scenario scenario = scenes::one_lawn();
    scenario.title = "'`a` & <b> c's \"d\" {e^f_g} %s \\n @h ]]> $(i)";
    CHECK_THAT(
        hyetograph(scenario, ChartFormat::svg),
        Contains(
            "<text>\u2019`a` &amp; &lt;b> c\u2019s \"d\" {e^f_g} %s \\n @h ]]&gt; $(i)</text>"));
    scenario.title = std::string(200, 'x');
    CHECK_THAT(hyetograph(scenario, ChartFormat::svg),
               Contains("<text>" + std::string(69, 'x') + "...</text>"));
}

TEST_CASE("storms without rain, of one step and of absurd size are drawn") {
    for (const auto& rain : {make_hyetograph({0.0, 1.0, 2.0}, "h", {0.0, 0.0}),
                             make_hyetograph({0.0, 1.0}, "min", {3.0}),
                             make_hyetograph({5.0e5, 5.0e5 + 1.0}, "h", {1.0e-7}),
                             make_hyetograph({0.0, 1.0, 2.0}, "h", {1.0e-300, 1.0e200}),
                             make_hyetograph({-1.0e300, 0.0, 1.0e300}, "h", {1.0, 2.0})}) {
        const Scenario scenario = scenes::scenario_of(
            "Quarry Row", {scenes::storm_of("storm", rain)}, {scenes::lawn(), scenes::roof()});
        CHECK(hyetograph(scenario, ChartFormat::svg).starts_with("<?xml"));
        CHECK(losses(scenario, ChartFormat::svg).starts_with("<?xml"));
        CHECK(losses(scenario, ChartFormat::svg, {{}, 0}).starts_with("<?xml"));
        CHECK(losses(scenario, ChartFormat::svg, {{}, 1}).starts_with("<?xml"));
        CHECK(losses(scenario, ChartFormat::text, {{}, 0}).ends_with("\n"));
    }
}

TEST_CASE("a hundred thousand steps make a picture of ordinary size") {
    std::vector<double> edges{0.0};
    std::vector<double> depths;
    for (int i = 0; i < 100'000; ++i) {
        edges.push_back(edges.back() + 5.0);
        depths.push_back(i % 7 == 0 ? 0.2 : 0.0);
    }
    const Scenario scenario = scenes::scenario_of(
        "A year at Millbrook depot",
        {scenes::storm_of("storm", make_hyetograph(std::move(edges), "min", std::move(depths)))});
    CHECK(hyetograph(scenario, ChartFormat::svg).size() < 500'000);
    CHECK(losses(scenario, ChartFormat::svg).size() < 500'000);
}

TEST_CASE("each chart ends with the caution on what it shows") {
    const std::string on_rain = std::string("<text>") + std::string(kRainCaution) + "</text>";
    const std::string on_losses = std::string("<text>") + std::string(kCaution) + "</text>";
    Scenario scenario = scenes::one_lawn();
    for (const std::size_t count : {1U, 2U}) {
        scenario.storms.resize(count, scenario.storms.front());
        CHECK_THAT(hyetograph(scenario, ChartFormat::svg), Contains(on_rain));
        CHECK_THAT(losses(scenario, ChartFormat::svg), Contains(on_losses) && !Contains(on_rain));
        CHECK_THAT(hyetograph(scenario, ChartFormat::text),
                   Catch::Matchers::EndsWith("\n\n" + std::string(kRainCaution) + "\n"));
        CHECK_THAT(losses(scenario, ChartFormat::text),
                   Catch::Matchers::EndsWith("\n\n" + std::string(kCaution) + "\n"));
    }
}

TEST_CASE("more panels than a page holds are refused") {
    const auto storms = [](std::size_t count) {
        return std::vector<Storm>(count, scenes::storm_of("again", scenes::half_an_hour()));
    };
    Scenario scenario = scenes::scenario_of("Tannery Lane", storms(12));
    CHECK(hyetograph(scenario, ChartFormat::svg).starts_with("<?xml"));
    CHECK(losses(scenario, ChartFormat::svg).starts_with("<?xml"));
    scenario.storms = storms(13);
    const Chart rain = hyetograph_chart(scenario, {});
    CHECK(!rain.bytes);
    CHECK(rain.problem == "a chart holds 12 panels at most, and there are 13 storms");
    CHECK(rain.hint == "choose one of them for its own chart");
    CHECK(rain.too_many);
    const auto ledgers = scenes::ledgers_of(scenario);
    const Chart losses = losses_chart(scenario, ledgers, {}, {});
    CHECK(!losses.bytes);
    CHECK(losses.problem == "a chart holds 12 panels at most, and there are 13 storms");
    CHECK(losses.hint == "choose one of them for its own chart");
    CHECK(losses.too_many);
    CHECK(losses_chart(scenario, ledgers, {12, {}}, {}).bytes);
}

TEST_CASE("without gnuplot a picture is refused with advice, and text is drawn") {
    const testing::Folder empty;
    const scenes::SearchPath path(empty.path());
    const Scenario scenario = scenes::one_lawn();
    const Chart chart = hyetograph_chart(scenario, {});
    CHECK(!chart.bytes);
    CHECK(chart.problem == "gnuplot is not installed");
    CHECK(!chart.too_many);
    CHECK(chart.hint ==
          "install it (Debian: apt install gnuplot-nox); everything but charts works without it");
    CHECK(hyetograph_chart(scenario, {ChartFormat::text, DisplayUnits::metric}).bytes);
    const auto ledgers = scenes::ledgers_of(scenario);
    CHECK(losses_chart(scenario, ledgers, {}, {ChartFormat::text, DisplayUnits::metric}).bytes);
}

TEST_CASE("what gnuplot says when it fails is passed on") {
    const testing::Folder folder;
    stand_in(folder,
             "echo partial\necho 'plot x' >&2\necho '     ^' >&2\n"
             "echo '\"-\" line 3: unknown terminal type' >&2\necho >&2\nexit 1\n");
    const scenes::SearchPath path(folder.path());
    const Chart chart = run_gnuplot("plot x\n");
    CHECK(!chart.bytes);
    CHECK(chart.problem == "gnuplot could not draw the chart: \"-\" line 3: unknown terminal type");
    CHECK(chart.hint ==
          "charts need gnuplot 5.4 or later with its terminals svg, pngcairo and pdfcairo");
}

TEST_CASE("gnuplot that is killed, and gnuplot that draws nothing, are failures") {
    const auto* commands = GENERATE("kill -9 $$\n", "exit 0\n");
    const testing::Folder folder;
    stand_in(folder, commands);
    const scenes::SearchPath path(folder.path());
    CHECK(run_gnuplot("plot x\n").problem ==
          "gnuplot could not draw the chart: it drew nothing and said nothing");
}

TEST_CASE("nobody waits for anybody, however much is written and whether or not it is read") {
    const testing::Folder folder;
    stand_in(folder, "head -c 3000000 /dev/zero >&2\nhead -c 3000000 /dev/zero\n");
    const scenes::SearchPath path(folder.path());
    const Chart chart = run_gnuplot(std::string(3'000'000, '\n'));
    REQUIRE(chart.bytes);
    CHECK(chart.bytes->size() == 3'000'000);
}

TEST_CASE("a gnuplot that may not be started is told apart from one that is not there") {
    const testing::Folder folder;
    stand_in(folder, "exit 0\n");
    std::filesystem::permissions(folder.path("gnuplot"), std::filesystem::perms::owner_read);
    const scenes::SearchPath path(folder.path());
    CHECK(run_gnuplot("plot x\n").problem == "gnuplot could not be started: Permission denied");
}
