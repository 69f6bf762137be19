#include <sstream>

#include "cli/storm_inputs.hpp"
#include "cli/storm_options.hpp"
#include "test.hpp"

namespace rainledger::cli_test {
namespace {

using Catch::Matchers::StartsWith;

/// What is wrong with the words, whatever the input is.
std::string problem_of(const std::vector<std::string>& words) {
    std::string problem;
    const auto options = read_storm_options(words, problem);
    CHECK(options.has_value() == problem.empty());
    return problem;
}

}  // namespace

TEST_CASE("every option of storm is read") {
    std::string problem;
    const std::vector<std::string> words{"in.csv",
                                         "--csv",
                                         "o.csv",
                                         "--json",
                                         "o.json",
                                         "--chart",
                                         "o.svg",
                                         "--units",
                                         "in",
                                         "--every",
                                         "5 min",
                                         "--quiet",
                                         "--storm",
                                         "a",
                                         "--duration",
                                         "2 h",
                                         "--pattern",
                                         "triangular",
                                         "--peak-at",
                                         "40 %",
                                         "--curve",
                                         "huff_1",
                                         "--tip",
                                         "0.2 mm",
                                         "--zone",
                                         "UTC",
                                         "--dry-spell",
                                         "3 h",
                                         "--sort",
                                         "peak_15",
                                         "--threshold",
                                         "0 mm",
                                         "--events",
                                         "--statistics",
                                         "s.csv",
                                         "--event",
                                         "3",
                                         "--fit-formula",
                                         "--spread-tips",
                                         "--return-period",
                                         "25 yr"};
    const auto options = read_storm_options(words, problem);
    INFO(problem);
    REQUIRE(options);
    CHECK(options->input == "in.csv");
    CHECK(options->csv == "o.csv");
    CHECK(options->json == "o.json");
    CHECK(options->chart == "o.svg");
    CHECK(options->units == DisplayUnits::inches);
    CHECK(options->every_h == 5.0 / 60.0);
    CHECK(options->quiet);
    CHECK(options->storm == "a");
    CHECK(options->duration_h == 2.0);
    CHECK(options->pattern == StormPattern::triangular);
    CHECK(options->peak_at == 0.4);
    CHECK(options->curve == "huff_1");
    CHECK(options->tip_mm == 0.2);
    CHECK(options->zone == "UTC");
    CHECK(options->dry_spell_h == 3.0);
    CHECK(options->sort == EventOrder::peak_15);
    CHECK(options->threshold_mm == 0.0);
    CHECK(options->events);
    CHECK(options->statistics == "s.csv");
    CHECK(options->event == 3U);
    CHECK(options->fit_formula);
    CHECK(options->spread_tips);
    CHECK(options->return_period_yr == 25.0);
    CHECK(options->given.size() == kStormOptions.size());
}

TEST_CASE("what is wrong with the words after storm is said in one line") {
    CHECK(problem_of({}) == "no input given; write 'rainledger storm INPUT'");
    CHECK(problem_of({"a", "--tip", "0.2", "mm"}) ==
          "one input at a time; 'mm' is one word too many (write a quantity as one word: --every "
          "'5 min')");
    CHECK(problem_of({"a", "--returnperiod", "10 yr"}) ==
          "unknown option '--returnperiod'; did you mean '--return-period'?");
    CHECK(problem_of({"a", "--return-period", "10"}) ==
          "--return-period: '10' has no unit; write a number with a unit, such as '10 yr' (units: "
          "yr)");
    CHECK(problem_of({"a", "--duration", "0 h"}) ==
          "--duration: '0 h' is no duration; it must be above zero");
    CHECK(problem_of({"a", "--threshold=-1 mm"}) ==
          "--threshold: '-1 mm' is no threshold; it must be zero or more");
    CHECK(problem_of({"a", "--pattern", "alternating-blocks"}) ==
          "--pattern: 'alternating-blocks' is not known; did you mean 'alternating_blocks'?");
    CHECK(problem_of({"a", "--curve", "nrcs_2"}) ==
          "--curve: 'nrcs_2' is not known; did you mean 'nrcs_I'?");
    CHECK(problem_of({"a", "--peak-at", "1.5"}) ==
          "--peak-at: '1.5' is no share of the duration; it must be from 0 to 1");
    CHECK(
        problem_of({"a", "--sort", "size"}) ==
        "--sort: 'size' is not known; known here: time, depth, peak_5, peak_15, peak_30, peak_60, "
        "rarity");
    for (const char* const wrong : {"0", "-1", "1.5", "1e3", "biggest"})
        CHECK(problem_of({"a", std::string("--event=") + wrong}) ==
              std::string("--event: '") + wrong +
                  "' is no event; write its number in the list of events, or 'largest'");
    CHECK(problem_of({"a", "--zone", "Europe/Nowhere"}) ==
          "--zone: 'Europe/Nowhere' is not in the time zone database; write a zone by its place, "
          "such as 'Europe/Madrid'");
    CHECK(problem_of({"a", "--csv", "-"}) ==
          "--csv: the steps go to a file, not to '-'; for standard output write --csv /dev/stdout");
    CHECK(problem_of({"a", "--csv", "x", "--json", "./x"}) ==
          "--csv and --json name the same file './x'");
    CHECK(problem_of({"a.csv", "--csv", "./a.csv"}) ==
          "'./a.csv' is the input itself; name another file to write");
    CHECK(problem_of({"a", "--statistics", "s.csv", "--json", "s.csv"}) ==
          "'s.csv' is the table of statistics itself; name another file to write");
}

TEST_CASE("options that do not go with the input are told what they go with") {
    const RainFolder rain;
    CHECK(complaint(rain, {"two.yaml", "--tip", "0.2 mm"}) ==
          "--tip goes with a gauge record, and 'two.yaml' is a scenario; name the record itself");
    CHECK(complaint(rain, {"two.yaml", "--duration", "2 h"}) ==
          "--duration goes with a table of statistics, and 'two.yaml' is a scenario");
    CHECK(complaint(rain, {"county.csv", "--events"}) ==
          "--events goes with a gauge record, and 'county.csv' is a table of statistics");
    CHECK(complaint(rain, {"rain.csv", "--storm", "x"}) ==
          "--storm goes with a scenario, and 'rain.csv' is rain");
    CHECK(complaint(rain, {"rain.csv", "--duration", "2 h"}) ==
          "--duration goes with a table of statistics, and 'rain.csv' is rain; a table has a row "
          "such as 'duration,2 yr [mm],10 yr [mm]' above its rows, '5 min,8.2,12.5'");
    CHECK(complaint(rain, {"logger.csv", "--tip", "0.2 mm", "--pattern", "uniform"}) ==
          "--pattern goes with a table of statistics, and 'logger.csv' is rain");
}

TEST_CASE("a design storm that lacks something says what") {
    const RainFolder rain;
    CHECK(complaint(rain, {"county.csv", "--return-period", "10 yr"}) ==
          "a design storm needs its duration, such as --duration '2 h'");
    CHECK(complaint(rain, {"county.csv", "--duration", "2 h"}) ==
          "a design storm needs its step, such as --every '5 min'");
    CHECK(complaint(rain, {"county.csv", "--pattern", "keifer_chu"}) ==
          "--pattern keifer_chu needs an intensity formula, and 'county.csv' is a table; "
          "--fit-formula fits one, to stand in a scenario under 'design:'");
    CHECK(complaint(rain, {"county.csv", "--fit-formula", "--duration", "2 h"}) ==
          "--fit-formula looks at the whole table; leave out the options of a design storm");
    const auto with = [&](const std::vector<std::string>& more) {
        return complaint(rain,
                         joined({"county.csv", "--duration", "2 h", "--every", "5 min"}, more));
    };
    CHECK_THAT(with({}), StartsWith("the table holds several return periods, and none is chosen"));
    CHECK_THAT(with({"--return-period", "500 yr"}),
               StartsWith("a return period of 500 yr lies outside the table"));
    CHECK(with({"--curve", "huff_1"}) == "--curve goes with --pattern mass_curve");
    CHECK(
        with({"--pattern", "mass_curve"}) ==
        "--pattern mass_curve needs --curve NAME; known here: nrcs_I, nrcs_IA, nrcs_II, nrcs_III, "
        "huff_1, huff_2, huff_3, huff_4");
    CHECK(with({"--pattern", "uniform", "--peak-at", "0.4"}) ==
          "--peak-at does not go with --pattern uniform, which has no peak");
}

TEST_CASE("a record's options that contradict each other are told") {
    const RainFolder rain;
    const auto of = [&](const std::vector<std::string>& more) {
        return complaint(rain, joined({"logger.csv", "--tip", "0.2 mm"}, more));
    };
    CHECK(of({"--events", "--event", "1"}) ==
          "--events lists them all and --event takes one; leave out one of the two");
    CHECK(of({"--event", "1", "--sort", "depth"}) == "--sort goes with the list of --events");
    CHECK(of({"--sort", "rarity"}) ==
          "--sort rarity needs --statistics FILE.csv, which says how rare an event was");
    CHECK(of({"--event", "3"}) ==
          "--event: there is no event 3; 'logger.csv' holds 2, which --events lists");
    CHECK(of({"--csv", "x.csv"}) ==
          "--csv needs a storm; cut one out of the record with --event NUMBER");
    CHECK(of({"--every", "0.0001 s"}) ==
          "--every: that step would cut the record into more than 100 million");
    CHECK(of({"--event", "1", "--every", "25 h"}) ==
          "--every: tips become steps that count from midnight, of a day at most");
    CHECK(of({"--events", "--json", "x.json", "--csv", "x.csv"}) ==
          "--csv needs a storm, and --events lists events; leave out one of the two");
    CHECK(complaint(rain, {"gauge.csv", "--spread-tips"}) ==
          "--spread-tips goes with a tip log; say what a tip is worth, such as --tip '0.2 mm'");
    CHECK(complaint(rain, {"gauge.csv", "--every", "30 min"}) ==
          "--every gives one storm other steps; choose one with --event NUMBER");
    CHECK(complaint(rain, {"logger.csv"}) ==
          "'logger.csv' has times and no depths, as a tip log; say what a tip is worth, such as "
          "--tip '0.2 mm'");
    rain.folder.write("list.csv", "duration,depth [mm]\n5 min,9.8\n1 h,31\n");
    CHECK(of({"--statistics", "list.csv"}) ==
          "--statistics: 'list.csv' names no return periods, so it cannot say how rare an event "
          "was");
}

TEST_CASE("files that what was found cannot fill, or that are the rain, are refused") {
    const RainFolder rain;
    CHECK(complaint(rain, {"two.yaml", "--csv", "x.csv"}) ==
          "--csv writes one storm; choose it with --storm NAME: short, long");
    CHECK(complaint(rain, {"two.yaml", "--storm", "lng"}) ==
          "--storm: 'lng' is not known; did you mean 'long'?");
    CHECK(complaint(rain, {"county.csv", "--csv", "x.csv"}) ==
          "--csv needs a storm; make one of the table with --duration and --every");
    CHECK(complaint(rain, {"rain.csv", "--every", "0.00001 s"}) ==
          "--every: that step would cut a storm into more than 10 million");
    rain.folder.write("yard.yaml", "storm: {hyetograph: rain.csv}\n");
    CHECK(complaint(rain, {"yard.yaml", "--csv", "./rain.csv"}) ==
          "'./rain.csv' is the scenario's rain; name another file to write");
}

TEST_CASE("both help pages of storm name every option, and the table in them makes a storm") {
    const RainFolder rain;
    const std::string brief = rain.storm({"-h"}).out;
    const std::string full = rain.storm({"--help"}).out;
    for (const OptionRow& row : kStormOptions) {
        CHECK_THAT(brief, Contains("--" + std::string(row.name)));
        CHECK_THAT(full, Contains("\n  --" + std::string(row.name)));
    }
    std::istringstream page(full);
    std::string table;
    for (std::string line; std::getline(page, line);)
        if (line.starts_with("  duration,") || (!table.empty() && line.starts_with("  ")))
            table += line.substr(2) + "\n";
        else if (!table.empty())
            break;
    rain.folder.write("county.csv", table);
    const Outcome outcome = rain.storm(
        {"county.csv", "--return-period", "10 yr", "--duration", "2 h", "--every", "5 min"});
    INFO(outcome.err);
    CHECK(outcome.status == 0);
    CHECK_THAT(outcome.out, Contains("  48.0 mm of rain in 2 h 00 min"));
}

}  // namespace rainledger::cli_test
