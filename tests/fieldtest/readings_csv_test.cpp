#include "rainledger/fieldtest/readings_csv.hpp"

#include "test.hpp"

namespace rainledger {
namespace {

FieldReadings read(const std::string& text, const std::optional<Rings>& rings = {}) {
    Diagnostics diagnostics;
    const auto readings = read_readings_csv("pit.csv", text, rings, diagnostics);
    for (const Diagnostic& diagnostic : diagnostics.list())
        UNSCOPED_INFO(render(diagnostic));
    REQUIRE(readings);
    CHECK(diagnostics.list().empty());
    return *readings;
}

std::string errors(const std::string& text, const std::optional<Rings>& rings = {}) {
    Diagnostics diagnostics;
    CHECK_FALSE(read_readings_csv("pit.csv", text, rings, diagnostics));
    std::string out;
    for (const Diagnostic& diagnostic : diagnostics.list())
        out += render(diagnostic);
    return out;
}

}  // namespace

TEST_CASE("a sheet of drops is read") {
    const FieldReadings sheet = read(
        "\xEF\xBB\xBF# Quarry Row\r\ntime [min], drop [mm], notes\r\n5, 12, clear\r\n\r\n10, "
        "8.5,\r\n");
    CHECK(sheet.kind == ReadingKind::drop);
    CHECK(sheet.time_unit == "min");
    CHECK(sheet.value_unit == "mm");
    REQUIRE(sheet.tests.size() == 1);
    CHECK(sheet.tests[0].readings.back().depth_mm == 20.5);
}

TEST_CASE("units, decimal commas, pits and refills are read") {
    const FieldReadings levels = read(
        "pit;time [s];water_level [cm];refill\n"
        "P1;0;10,5;\nP1;600;9,5;\nP1;600;12;x\nP1;1200;11,5;\nP2;0;10;no\nP2;900;8;\n");
    REQUIRE(levels.tests.size() == 2);
    CHECK(levels.tests[0].pit == "P1");
    CHECK_THAT(levels.tests[0].readings.back().depth_mm, WithinRel(15.0, 1.0e-12));
    CHECK_THAT(levels.tests[1].readings.back().rate_mm_per_h, WithinRel(80.0, 1.0e-12));

    const FieldReadings volumes =
        read("Time [h]\tVolume added [mL]\n0.5\t100\n1\t50\n", Rings{300.0});
    CHECK(volumes.kind == ReadingKind::volume_added);
    CHECK_THAT(volumes.tests[0].readings[0].depth_mm, WithinRel(1.4147, 1.0e-4));
    CHECK_THAT(
        read("time [h],volume_added [L]\n0.5,0.1\n", Rings{300.0}).tests[0].readings[0].depth_mm,
        WithinRel(1.4147, 1.0e-4));
}

TEST_CASE("headers that do not do are told, all at once") {
    CHECK(
        errors("") ==
        "pit.csv:1:1: error: the file holds no rows\n"
        "    a file begins with a row such as 'time [min],drop [mm]', then one row per reading\n");
    CHECK(
        errors("minutes,water\n5,3\n") ==
        "pit.csv:1:1: error: there is no time column\n"
        "    minutes,water\n"
        "    ^\n"
        "    call it 'time [min]'\n"
        "pit.csv:1:1: error: there is no column of readings\n"
        "    minutes,water\n"
        "    ^\n"
        "    call it 'infiltrated [mm]', 'drop [mm]', 'volume_added [mL]' or 'water_level [mm]'\n");
    CHECK(errors("time,drop [mm/h],refil\n5,3,\n") ==
          "pit.csv:1:18: error: column 'refil' looks like a slip for 'refill'\n"
          "    time,drop [mm/h],refil\n"
          "                     ^\n"
          "    rename it\n"
          "pit.csv:1:1: error: column 'time' has no unit\n"
          "    time,drop [mm/h],refil\n"
          "    ^\n"
          "    write it in brackets, 'time [min]'\n"
          "pit.csv:1:6: error: 'mm/h' is not a unit of depth\n"
          "    time,drop [mm/h],refil\n"
          "         ^\n"
          "    known here: mm, cm, m, in, ft\n");
    CHECK(errors("time [min],drop [mm],infiltrated [mm],time [h]\n5,3,3,1\n") ==
          "pit.csv:1:39: error: a second column is called 'time [h]'\n"
          "    time [min],drop [mm],infiltrated [mm],time [h]\n"
          "                                          ^\n"
          "    rename one of the two\n"
          "pit.csv:1:22: error: there are two columns of readings, 'infiltrated [mm]' and 'drop "
          "[mm]'\n"
          "    time [min],drop [mm],infiltrated [mm],time [h]\n"
          "                         ^\n"
          "    keep the one that was read, and rename the other\n");
    CHECK(errors("time [min],volume_added [ml]\n5,300\n", Rings{300.0}) ==
          "pit.csv:1:12: error: 'ml' is not a unit of volume\n"
          "    time [min],volume_added [ml]\n"
          "               ^\n"
          "    did you mean 'mL'? known here: L, mL, m3, ft3, gal, ac-ft\n");
    CHECK(
        errors("time [min],volume_added [mL]\n5,300\n") ==
        "pit.csv:1:12: error: volumes need the inner ring's diameter to become depths\n"
        "    time [min],volume_added [mL]\n"
        "               ^\n"
        "    state it: 'ring: {inner_diameter: 300 mm}' beside 'readings:', or --ring '300 mm'\n");
    CHECK_THAT(errors("time [min],drop [mm]\n"), Contains("there are no rows below the header"));
}

TEST_CASE("cells that do not do are told, with what reduction finds") {
    CHECK(errors("time [min],drop [mm],pit\n5,12 mm,A\n10,,A\n10,3,\n9,-3,A\n12,4\n") ==
          "pit.csv:2:3: error: '12 mm' is no number\n"
          "    5,12 mm,A\n"
          "      ^\n"
          "    the unit stands in the header alone\n"
          "pit.csv:3:4: error: this cell is empty\n"
          "    10,,A\n"
          "       ^\n"
          "    leave out a row that was not read; a row at time 0 holds 0\n"
          "pit.csv:4:6: error: this row has no pit\n"
          "    10,3,\n"
          "         ^\n"
          "    name the pit on every row\n"
          "pit.csv:6:1: error: this row has 2 cells, the header 3\n"
          "    12,4\n"
          "    ^\n"
          "    with a decimal comma, separate the cells by semicolons\n"
          "pit.csv:5:3: error: a drop of -3 mm is negative\n"
          "    9,-3,A\n"
          "      ^\n"
          "    a drop is how far the water fell since the reading before\n");
    CHECK(errors("time [min],water_level [mm],refill\n0,100,\n5,110,maybe\n") ==
          "pit.csv:3:7: error: 'maybe' is no mark of a refill\n"
          "    5,110,maybe\n"
          "          ^\n"
          "    write x or yes on the row of the level just after filling, and nothing elsewhere\n");
}

TEST_CASE("twenty errors are listed and the others counted") {
    std::string text = "time [min],drop [mm]\n";
    for (int i = 1; i <= 22; ++i)
        text += std::to_string(i) + ",-1\n";
    CHECK_THAT(errors(text), Catch::Matchers::EndsWith("pit.csv: error: and 2 more errors\n"));
}

TEST_CASE("no spoiled sheet is read without an error, or fails with none") {
    const std::string whole =
        "pit;time [s];water_level [cm];refill\nP1;0;10,5;\nP1;600;9,5;\nP1;600;12;x\nP1;900;11;\n";
    const auto settles = [](const std::string& text) {
        Diagnostics diagnostics;
        return read_readings_csv("pit.csv", text, {}, diagnostics).has_value() !=
               diagnostics.has_errors();
    };
    for (std::size_t i = 0; i < whole.size(); ++i) {
        INFO(i);
        CHECK(settles(whole.substr(0, i)));
        for (const char spoiled : {'\0', '\n', ';', '-', '9', '"', '\xFF'}) {
            std::string text = whole;
            text[i] = spoiled;
            CHECK(settles(text));
        }
    }
}

}  // namespace rainledger
