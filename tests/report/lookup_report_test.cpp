#include "rainledger/report/lookup_report.hpp"

#include <nlohmann/json.hpp>

#include "rainledger/report/caution.hpp"
#include "rainledger/report/version.hpp"
#include "report/lookup_parts.hpp"
#include "test.hpp"

namespace rainledger {
namespace {

using nlohmann::json;

constexpr Source kHandbook{"Handbook", "Author", "Title", "2031", "1st edition"};
constexpr Source kBooklet{"Booklet", "Other", "Leaflet", "undated", ""};

/// An invented row: 88.9 mm printed in cm, a rate with a fault, and a plain number that is missing.
RowView row(const std::string& name, double suction_mm) {
    return {
        name,
        {{"suction_mm", "suction", Dimension::suction, "cm", {suction_mm, ValueRange{13.3, 593.8}}},
         {"rate_mm_per_h",
          "rate",
          Dimension::rate,
          "cm/h",
          {3.4, {}},
          PrintedFault{"looks exchanged", 6.5, ValueRange{5.0, 8.0}}},
         {"share", "share", {}, "", {}}},
        {"ranges are wide"},
        {&kHandbook, "table 4", Status::confirmed}};
}

std::string text_of(const LookupSection& section, DisplayUnits units = DisplayUnits::metric) {
    return lookup_text(std::vector{section}, {units});
}

std::string ending() {
    return "\n" + std::string(kLookupCaution) + "\nrainledger " + std::string(version()) + "\n";
}

}  // namespace

TEST_CASE("one row is shown in full, with its fault, source and fragment") {
    const LookupSection section{"Suction by soil",
                                {row("peaty loam", 88.9)},
                                "B/D",
                                {"The rest is yours."},
                                "losses:\n  green_ampt:\n"};
    CHECK(
        text_of(section) ==
        "Suction by soil: peaty loam\n"
        "  Answer: B/D\n"
        "           value     range             source's unit\n"
        "  ---------------------------------------------------------------\n"
        "  suction  88.9 mm   13.3 to 593.8 mm  8.89 cm (1.33 to 59.38 cm)\n"
        "  rate *   3.4 mm/h                    0.34 cm/h\n"
        "  * rate: looks exchanged; corrected: 6.5 mm/h (0.65 cm/h); corrected range: 5 mm/h to 8 "
        "mm/h\n"
        "  Note: ranges are wide\n"
        "  Source: Author: Title, 2031, 1st edition, table 4 (confirmed)\n"
        "  The rest is yours.\n"
        "\n"
        "  For a surface of a scenario:\n"
        "\n"
        "    losses:\n"
        "      green_ampt:\n" +
            ending());
}

TEST_CASE("several rows are a table; what they share is said once") {
    RowView other = row("clay", 25.4);
    other.values[1].fault.reset();
    other.notes.emplace_back("of a drained bog");
    other.provenance = {&kBooklet, "page 3", Status::from_memory};
    const LookupSection section{"Suction by soil", {row("loam", 50.8), other}, {}, {}, {}};
    CHECK(text_of(section, DisplayUnits::inches) ==
          "Suction by soil\n"
          "        suction              rate\n"
          "        in                   in/h  share  note  source\n"
          "  ----------------------------------------------------\n"
          "  loam  2 (0.5236-23.38)  0.1339*         1     a\n"
          "  clay  1 (0.5236-23.38)   0.1339         2     b\n"
          "  Note: ranges are wide\n"
          "  Note 1: * loam, rate: looks exchanged; corrected: 0.2559 in/h (0.65 cm/h); corrected "
          "range:\n"
          "      0.1969 in/h to 0.315 in/h\n"
          "  Note 2: of a drained bog\n"
          "  Source a: Author: Title, 2031, 1st edition, table 4 (confirmed)\n"
          "  Source b: Other: Leaflet, undated, page 3 (from memory)\n" +
              ending());
}

TEST_CASE("long names give way to the page") {
    const std::string name =
        "close-seeded legumes or rotation meadow on sloping ground of the valley, contoured and "
        "terraced";
    const LookupSection section{
        "Suction by soil", {row(name, 10.0), row("loam", 20.0)}, {}, {}, {}};
    const std::string text = text_of(section);
    CHECK_THAT(text, Contains("\n  close-seeded legumes or rotation meadow on sloping"));
    CHECK_THAT(text, Contains("\n    the valley, contoured and terraced\n"));
    for (std::size_t at = 0; at < text.size();) {
        const std::size_t end = text.find('\n', at);
        CHECK(end - at <= kLookupWidth);
        at = end + 1;
    }
}

TEST_CASE("the JSON holds canonical units and the provenance of every row") {
    const LookupSection section{
        "Suction by soil", {row("loam", 88.9)}, {}, {"The rest is yours."}, "losses: impervious\n"};
    const json made = json::parse(lookup_json(std::vector{section}));
    CHECK(made["program"]["version"] == std::string(version()));
    CHECK(made["caution"] == std::string(kLookupCaution));
    CHECK(made["warnings"] ==
          json{"loam: rate as printed: looks exchanged; corrected: 6.5 mm/h (0.65 cm/h); corrected "
               "range: 5 mm/h to 8 mm/h"});
    const json& shown = made["sections"][0];
    CHECK(shown["heading"] == "Suction by soil");
    CHECK(shown["answer"].is_null());
    CHECK(shown["lines"] == json{"The rest is yours."});
    CHECK(shown["yaml"] == "losses: impervious\n");
    const json& values = shown["rows"][0]["values"];
    CHECK(values["suction_mm"] == json{{"value", 88.9},
                                       {"low", 13.3},
                                       {"high", 593.8},
                                       {"printed_unit", "cm"},
                                       {"fault", nullptr}});
    CHECK(values["rate_mm_per_h"]["fault"] == json{{"words", "looks exchanged"},
                                                   {"corrected", 6.5},
                                                   {"corrected_low", 5.0},
                                                   {"corrected_high", 8.0}});
    CHECK(values["share"]["value"].is_null());
    CHECK(shown["rows"][0]["notes"] == json{"ranges are wide"});
    CHECK(shown["rows"][0]["source"] == json{{"author", "Author"},
                                             {"title", "Title"},
                                             {"year", "2031"},
                                             {"edition", "1st edition"},
                                             {"place", "table 4"},
                                             {"status", "confirmed"},
                                             {"remark", nullptr}});
}

TEST_CASE("a fault warns where the row makes a fragment, and there alone") {
    LookupSection section{"Suction by soil", {row("loam", 88.9)}, {}, {}, {}};
    CHECK(lookup_warnings(std::vector{section}).empty());
    section.yaml = "losses: impervious\n";
    CHECK(lookup_warnings(std::vector{section}).size() == 1);
}

}  // namespace rainledger
