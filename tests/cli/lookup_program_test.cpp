#include <nlohmann/json.hpp>

#include "cli/lookup_options.hpp"
#include "cli/runner.hpp"
#include "cli/storm_inputs.hpp"
#include "rainledger/report/caution.hpp"
#include "test.hpp"

namespace rainledger::cli_test {
namespace {

using Catch::Matchers::EndsWith;
using Catch::Matchers::StartsWith;
using nlohmann::json;

Outcome look_up(const Setting& setting, const std::vector<std::string>& words) {
    return run(setting, joined({"lookup"}, words));
}

/// What a run says is wrong with the words.
std::string complaint(const std::vector<std::string>& words) {
    const Folder folder;
    const Outcome outcome = look_up({folder.path()}, words);
    CHECK(outcome.status == 2);
    CHECK(outcome.out.empty());
    const std::string lead = "rainledger lookup: ";
    const std::string end = "\nSee 'rainledger lookup --help'.\n";
    REQUIRE(outcome.err.starts_with(lead));
    REQUIRE(outcome.err.ends_with(end));
    return outcome.err.substr(lead.size(), outcome.err.size() - lead.size() - end.size());
}

/// A scenario whose one surface has the lines of a fragment, indented as they are shown.
std::string scenario_with(const std::string& yaml, bool with_losses) {
    std::string out =
        "storm:\n  steps: {every: 30 min, depths: [2, 20, 30, 4], unit: mm}\n"
        "surfaces:\n  verge:\n    area: 1000 m2\n";
    if (with_losses) out += "    losses: impervious\n";
    for (std::size_t at = 0; at < yaml.size();) {
        const std::size_t end = yaml.find('\n', at) + 1;
        out += "    " + yaml.substr(at, end - at);
        at = end;
    }
    return out;
}

}  // namespace

TEST_CASE("no topic lists them all") {
    const Folder folder;
    const Outcome outcome = look_up({folder.path()}, {});
    CHECK(outcome.status == 0);
    CHECK(outcome.err.empty());
    CHECK_THAT(outcome.out, StartsWith("Topics of rainledger lookup:\n\n  soil [NAME] "));
    for (const LookupTopic& topic : kLookupTopics)
        CHECK_THAT(outcome.out, Contains("\n  " + std::string(topic.name) + " "));
}

TEST_CASE("a soil is shown, its fault noted on standard error unless quiet") {
    const Folder folder;
    const Outcome outcome = look_up({folder.path()}, {"soil", "Silt", "Loam"});
    CHECK(outcome.status == 0);
    CHECK_THAT(outcome.out, StartsWith("Green-Ampt parameters by soil texture: silt loam\n"));
    CHECK_THAT(outcome.out, Contains("        effective_conductivity: 0.65 cm/h\n"));
    CHECK_THAT(outcome.out, Contains(std::string(kLookupCaution)));
    CHECK(
        outcome.err ==
        "rainledger: note: silt loam: effective conductivity as printed: looks exchanged with "
        "loam: half the saturated conductivity of 1982 is 0.34 cm/h for silt loam; corrected: 3.4 "
        "mm/h (0.34 cm/h)\n");
    const Outcome quiet = look_up({folder.path()}, {"soil", "silt-loam", "--quiet"});
    CHECK(quiet.err.empty());
    CHECK(quiet.out == outcome.out);
}

TEST_CASE("every fragment runs in a scenario") {
    const Folder folder;
    const Setting setting{folder.path()};
    const std::vector<std::vector<std::string>> asked{
        {"soil", "sandy loam", "--saturation", "40 %"},
        {"texture", "--sand", "42", "--clay", "18", "--saturation", "0.3"},
        {"cover", "open space", "--condition", "good", "--soil-group", "B/D"},
        {"cover", "meadow", "--soil-group", "C", "--impervious", "25 %", "--connected", "50 %"},
        {"antecedent", "71.5"},
        {"horton", "Tifton"},
        {"horton", "soil group B Denver"},
        {"storage", "flat roofs"},
        {"storage", "--slope", "2 %"},
        {"interception", "orchards", "--rain", "1 in"}};
    for (const std::vector<std::string>& words : asked) {
        const json made = json::parse(look_up(setting, joined(words, {"--json", "-"})).out);
        std::size_t fragments = 0;
        for (const json& section : made["sections"]) {
            if (section["yaml"].is_null()) continue;
            const std::string yaml = section["yaml"];
            const bool lacks_losses = yaml.find("losses:") == std::string::npos;
            folder.write("made.yaml", scenario_with(yaml, lacks_losses));
            const Outcome outcome = run(setting, {"losses", "made.yaml"});
            INFO(yaml + outcome.err);
            CHECK(outcome.status == 0);
            ++fragments;
        }
        INFO(words.front());
        CHECK(fragments >= 1);
    }
}

TEST_CASE("the JSON goes to a file or to standard output, in canonical units") {
    const Folder folder;
    const Setting setting{folder.path()};
    const Outcome text = look_up(setting, {"soil-group", "--conductivity", "1 in/h", "--units",
                                           "in", "--json", "group.json"});
    CHECK(text.status == 0);
    CHECK_THAT(text.out, Contains("transmits least 1 in/h;"));
    CHECK(folder.names() == std::vector<std::string>{"group.json"});
    const json made = json::parse(folder.read("group.json"));
    CHECK(made["sections"][0]["answer"] == "B");
    CHECK_THAT(made["sections"][0]["lines"][0].get<std::string>(),
               Contains("transmits least 25.4 mm/h;"));
    const Outcome shown =
        look_up(setting, {"soil-group", "--conductivity", "1 in/h", "--json", "-"});
    CHECK(shown.out == folder.read("group.json"));
    const Outcome lost = look_up(setting, {"soil", "--json", "nowhere/soil.json"});
    CHECK(lost.status == 4);
    CHECK(lost.out.empty());
    CHECK(lost.err == "rainledger: cannot write nowhere/soil.json: No such file or directory\n");
}

TEST_CASE("the help names every topic and option, and ends in the caution") {
    const Folder folder;
    const Outcome page = look_up({folder.path()}, {"--help"});
    CHECK(page.status == 0);
    for (const OptionRow& row : kLookupOptions)
        CHECK_THAT(page.out, Contains("\n  --" + std::string(row.name) + " "));
    CHECK_THAT(page.out, EndsWith("\n" + std::string(kLookupCaution) + "\n"));
    const Outcome short_page = look_up({folder.path()}, {"soil", "-h"});
    CHECK(page.out.starts_with(short_page.out));
}

TEST_CASE("every option but the shared ones goes with a topic, and every topic's are known") {
    std::string goes_with;
    for (const LookupTopic& topic : kLookupTopics)
        goes_with += " " + std::string(topic.options) + " ";
    for (const OptionRow& row : kLookupOptions) {
        if (row.name == "json" || row.name == "units" || row.name == "quiet") continue;
        CHECK_THAT(goes_with, Contains(" " + std::string(row.name) + " "));
    }
}

TEST_CASE("a wrong command line is told in one line") {
    CHECK(complaint({"soils"}) == "unknown topic 'soils'; did you mean 'soil'?");
    CHECK_THAT(complaint({""}), StartsWith("unknown topic ''; known here: soil, texture, cover,"));
    CHECK(complaint({"--json", "x"}) == "--json needs a topic; 'rainledger lookup' lists them");
    CHECK(complaint({"soil", "loam", "--sand", "3"}) == "--sand goes with texture, not with soil");
    CHECK(complaint({"cover", "--saturation", "3"}) ==
          "--saturation goes with soil and texture, not with cover");
    CHECK(complaint({"soil", "laom"}) == "no row is named 'laom'; did you mean 'loam'?");
    CHECK(complaint({"cover", "woods", "--condition", "god"}) ==
          "--condition: 'god' is not known; did you mean 'good'?");
    CHECK(complaint({"cover", "meadow", "--soil-group", "E"}) ==
          "--soil-group: unknown soil group 'E'; known here: A, B, C, D, A/D, B/D, C/D");
    CHECK(complaint({"cover", "meadow", "--soil-group", "B", "--impervious", "65"}) ==
          "--impervious: '65' is no share; it must be from 0 to 1, or from 0 % to 100 %");
    CHECK(complaint({"soil", "loam", "--saturation", "40", "%"}) ==
          "--saturation: '40' is no share; it must be from 0 to 1, or from 0 % to 100 % (a number "
          "and its unit are one word: '3.4 mm/h')");
    CHECK_THAT(complaint({"soil-group", "--conductivity", "3.4", "mm/h"}),
               StartsWith("--conductivity: '3.4' has no unit; write a number with a unit") &&
                   EndsWith("(a number and its unit are one word: '3.4 mm/h')"));
    CHECK(complaint({"texture", "--sand", "42", "--clay", "x"}) ==
          "--clay: 'x' is no percentage; write a number from 0 to 100");
    CHECK(complaint({"storage", "--slope", "0 %"}) == "the slope must be above 0, and finite");
    CHECK(complaint({"soil", "--units", "cm"}) == "--units: 'cm' is not known; write mm or in");
    CHECK(complaint({"soil", "--satuation", "0.4"}) ==
          "unknown option '--satuation'; did you mean '--saturation'?");
}

}  // namespace rainledger::cli_test
