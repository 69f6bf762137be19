#include <random>
#include <string>

#include "scenario/read_text.hpp"
#include "test.hpp"

// Whatever the bytes, the reader returns: with a scenario, or with errors that say why there is
// none.
namespace rainledger {
namespace {

const std::string kSeedText = R"(title: Millbrook depot
storms:
  morning: {steps: {every: 5 min, depths: [0.4, 1.1, 2.6], unit: mm}, multiply_by: 1.2}
  noon: {design: {pattern: keifer_chu, duration: 2 h, every: 10 min, formula: {a: 9 in/h, b: 13, time: min}}}
  night: {design: {pattern: mass_curve, duration: 2 h, every: 9 min, depth: 62 mm, curve: [[0, 0], [0.4, 1], [1, 1]]}}
  blocks: {design: {pattern: alternating_blocks, duration: 1 h, every: 5 min, depths: {5 min: 9 mm, 1 h: 3 cm}}, resample: 9 min}
  evening: {steps: {ends: [5 min, 12 min], intensities: [3, 4], unit: mm/h}, continue_for: 1 h}
surfaces:
  verge:
    area: 1600 m2
    drains_to: CB-2
    interception: 1 mm
    depression_storage: 4 mm
    ponded_water: infiltrates
    losses: {green_ampt: {effective_conductivity: 10.9 mm/h, suction_deficit: 22 mm}}
  lawn: &lawn
    area: 0.28 ha
    losses: {horton: {initial_capacity: 50 mm/h, final_capacity: 6 mm/h, decay: 4.14 1/h}}
  copy: *lawn
  yard:
    area: 1000 m2
    losses: {curve_number: {number: 89, initial_abstraction_ratio: 0.2, antecedent: III}}
  parking:
    area: 0.48 ha
    losses: impervious
    runs_onto: {verge: 30 %, lawn: 0.2}
)";

using Random = std::mt19937;

std::size_t below(Random& random, std::size_t bound) {
    return std::uniform_int_distribution<std::size_t>(0, bound - 1)(random);
}

/// One small change: a byte set, removed, doubled or swapped for a piece that YAML cares about.
void mutate(std::string& text, Random& random) {
    static const std::string kPieces[] = {"{",  "}",   "[",   "]",     ": ", "\n",     "  ",   "- ",
                                          "&a", "*a",  "|\n", "\"",    "'",  "\t",     "#",    "? ",
                                          "~",  "1e9", "-",   "---\n", "%",  "!!str ", "<<: ", "0"};
    if (text.empty()) text = "a";
    const std::size_t at = below(random, text.size());
    switch (below(random, 5)) {
        case 0:
            text[at] = static_cast<char>(below(random, 256));
            break;
        case 1:
            text.erase(at, 1 + below(random, 20));
            break;
        case 2:
            text.insert(at, kPieces[below(random, std::size(kPieces))]);
            break;
        case 3:
            text.insert(at, text.substr(below(random, text.size()), below(random, 40)));
            break;
        default:
            text.replace(at, 1, kPieces[below(random, std::size(kPieces))]);
    }
}

}  // namespace

TEST_CASE("mutated scenarios are read or refused, never more") {
    const unsigned seed = 20260304;
    INFO("seed " << seed);
    Random random(seed);
    REQUIRE(read_text_of_test(kSeedText).scenario);
    int read = 0;
    for (int round = 0; round < 4000; ++round) {
        std::string text = kSeedText;
        const std::size_t changes = 1 + below(random, 3);
        for (std::size_t change = 0; change < changes; ++change)
            mutate(text, random);
        INFO("round " << round << "\n" << text);
        const Outcome outcome = read_text_of_test(text);
        REQUIRE(outcome.scenario.has_value() == (outcome.errors == 0));
        if (outcome.scenario) ++read;
    }
    CHECK(read > 20);
    CHECK(read < 3980);
}

TEST_CASE("deep nesting and references to themselves are refused") {
    for (const std::string& text : {std::string(100000, '['), std::string(100000, '{')})
        CHECK_THAT(problems(text), Contains("maps or lists are nested too deeply"));
    CHECK(read_text_of_test("storm: &a [*a]\nsurfaces: &b {x: *b}\n").errors > 0);
    CHECK(read_text_of_test(kQuietStorm + "surfaces: &b {x: *b, y: {area: 1 ha, losses: *b}}\n")
              .errors > 0);
}

TEST_CASE("a chain of many surfaces is walked without recursion") {
    std::string text = kQuietStorm + "surfaces:\n";
    const int count = 20000;
    for (int i = 0; i < count; ++i)
        text += "  s" + std::to_string(i) + ": {area: 1 ha, losses: impervious" +
                (i + 1 < count ? ", runs_onto: s" + std::to_string(i + 1) : "") + "}\n";
    const Outcome outcome = read_text_of_test(text);
    REQUIRE(outcome.scenario);
    CHECK(outcome.scenario->site.surfaces.front().runs_onto[0].surface == 1);
}

}  // namespace rainledger
