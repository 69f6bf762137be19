#include <string>

#include "rain/csv_helpers.hpp"
#include "rain/stamp_advice.hpp"
#include "test.hpp"

namespace rainledger {
namespace {

/// The last line of the first problem: what to do about it.
std::string advice_for(const std::string& text, const CsvLayout& layout = {}) {
    Diagnostics diagnostics;
    const auto rain = read_hyetograph_csv("site/gauge.csv", text, layout, diagnostics);
    CHECK_FALSE(rain.has_value());
    REQUIRE_FALSE(diagnostics.list().empty());
    return diagnostics.list().front().hint;
}

std::string stamp_hint(const std::string& text) {
    return advice_for("end,depth [mm]\n" + text + ",1\n");
}

std::string elapsed_hint(const std::string& text) {
    return advice_for("end [min],depth [mm]\n" + text + ",1\n");
}

}  // namespace

TEST_CASE("a time of the day alone is asked for its date") {
    CHECK(problems_in("start,depth [mm]\n0:05,1\n", {}) ==
          R"(gauge.csv:2:1: error: '0:05' is not a timestamp
    0:05,1
    ^
    put the date in the same cell, such as 2026-03-04 00:05, or give minutes in a column 'start [min]'
)");
    CHECK(stamp_hint("10:00:30") ==
          "put the date in the same cell, such as 2026-03-04 10:00:30, or give minutes in a column "
          "'end [min]'");
    CHECK(stamp_hint("12:05 AM") ==
          "put the date in the same cell, such as 2026-03-04 00:05, or give minutes in a column "
          "'end [min]'");
    CHECK(stamp_hint("25:00") == "write 2026-03-04T10:05 or 2026-03-04 10:05:00+01:00");
    CHECK(elapsed_hint("0:05") ==
          "write elapsed time as a plain number in min, not as hours:minutes");
}

TEST_CASE("a date in another order is written out as it is wanted") {
    const std::string write = "write year-month-day and the time of the day, ";
    CHECK(stamp_hint("04/03/2031 10:00") == write + "2031-03-04 10:00 or 2031-04-03 10:00");
    CHECK(stamp_hint("04/04/2031 10:00") == write + "2031-04-04 10:00");
    CHECK(stamp_hint("25/03/2031 9:05:30") == write + "2031-03-25 09:05:30");
    CHECK(stamp_hint("3/25/2031 1:05 PM") == write + "2031-03-25 13:05");
    CHECK(stamp_hint("04.03.2031") == write + "2031-03-04 00:00");
    CHECK(stamp_hint("04.03.2031 10:00") == write + "2031-03-04 10:00");
    CHECK(stamp_hint("4-3-2031 10:00") == write + "2031-03-04 10:00 or 2031-04-03 10:00");
    CHECK(stamp_hint("2031/03/04 10:00+01:00") == write + "2031-03-04 10:00+01:00");
    CHECK(stamp_hint("2031-3-4 1:05") == write + "2031-03-04 01:05");
    CHECK(stamp_hint("2031-03-04") == write + "2031-03-04 00:00");
    for (const char* text : {"04/03/31 10:00", "31.31.2031", "04/03.2031", "04/03/2031 10h", "4/3",
                             "04/03/20311", "2031-03-04x", "5 March"})
        CHECK(stamp_hint(text) == "write 2026-03-04T10:05 or 2026-03-04 10:05:00+01:00");
    CHECK(elapsed_hint("04/03/2031 10:00") ==
          "timestamps take no unit in the header, and are written 2026-03-04 10:05");
}

TEST_CASE("a row of totals is to be removed") {
    CHECK(problems_in("end [min],depth [mm]\n5,1\nTotal,1\n", {}) ==
          R"(gauge.csv:3:1: error: 'Total' is not a number
    Total,1
    ^
    remove the total row
)");
    CHECK(stamp_hint("TOTAL") == "remove the total row");
    CHECK(stamp_hint("Sum") == "remove the total row");
    CHECK(time_shape("totalizer") == TimeShape::other);
}

TEST_CASE("a foreign header is named in the scenario as advised, and is then read") {
    SECTION("rain") {
        CHECK(problems_in("end [min],Rain (mm)\n5,1\n", {}) ==
              R"(gauge.csv:1:1: error: there is no rain column
    end [min],Rain (mm)
    ^
    columns here: 'end [min]', 'Rain (mm)'; call it 'depth [mm]', 'intensity [mm/h]' or 'cumulative [mm]'; or say in the scenario: hyetograph: {file: gauge.csv, rain: 'Rain (mm)', kind: depth, unit: mm}
)");
        CsvLayout layout;
        layout.rain_column = "Rain (mm)";
        layout.kind = RainKind::depth;
        layout.rain_unit = "mm";
        CHECK(read_clean("end [min],Rain (mm)\n5,1\n", layout).depth_mm[0] == 1.0);
    }
    SECTION("rain, with its unit or kind in other places") {
        const auto says = [](const std::string& header) {
            const std::string hint = advice_for("end [min];" + header + "\n5;1\n");
            const std::size_t at = hint.find("rain: ");
            return at == std::string::npos ? hint : hint.substr(at);
        };
        CHECK(says("note;rain [mm];x") == "rain: 'rain [mm]', kind: depth}");
        CHECK(says("Precip (MM/H)") == "rain: 'Precip (MM/H)', kind: intensity, unit: mm/h}");
        CHECK(says("accumulated rain") == "rain: 'accumulated rain', kind: cumulative, unit: mm}");
        CHECK(says("rain rate") == "rain: 'rain rate', kind: intensity, unit: mm/h}");
        CHECK(says("gauge's P") == "rain: 'gauge''s P', kind: depth, unit: mm}");
    }
    SECTION("time and rain") {
        CHECK(advice_for("Logged at date,P (mm)\n2026-03-04 10:05,1\n") ==
              "columns here: 'Logged at date', 'P (mm)'; call it 'end [min]', or 'end' for "
              "timestamps; or say in the scenario: hyetograph: {file: gauge.csv, time: 'Logged at "
              "date', stamp: end, rain: 'P (mm)', kind: depth, unit: mm}");
        CHECK_THAT(advice_for("Begin minutes (min),depth [mm]\n0,1\n"),
                   Catch::EndsWith("hyetograph: {file: gauge.csv, time: 'Begin minutes (min)', "
                                   "time_unit: min, stamp: start}"));
    }
    SECTION("a file name that needs quotes") {
        CHECK_THAT(problems_in("end [min],P\n5,1\n", {}), Contains("{file: gauge.csv,"));
        Diagnostics diagnostics;
        CHECK_FALSE(read_hyetograph_csv("a/gauge 1.csv", "end [min],P\n5,1\n", {}, diagnostics));
        CHECK_THAT(diagnostics.list().front().hint, Contains("{file: 'gauge 1.csv',"));
    }
    SECTION("nothing that could be meant") {
        CHECK(advice_for("A,\n1,2\n") ==
              "columns here: 'A', ''; call it 'end [min]', or 'end' for timestamps");
        CHECK(advice_for("Station at Millbrook depot\nend [min],depth [mm]\n5,1\n") ==
              "if this line is a note, begin it with #; columns here: 'Station at Millbrook "
              "depot'; call it 'end [min]', or 'end' for timestamps");
    }
}

TEST_CASE("units in round brackets or capitals are named as slips") {
    CHECK(advice_for("end [min],Depth (mm)\n5,1\n") ==
          "units stand in square brackets: 'depth [mm]'; or say in the scenario: hyetograph: "
          "{file: gauge.csv, rain: 'Depth (mm)', kind: depth, unit: mm}");
    CHECK(advice_for("end [Min],depth [mm]\n5,1\n") ==
          "did you mean 'min'? known here: s, min, h, hr, d; timestamps take no unit");
    CHECK(advice_for("end [min],depth [MM]\n5,1\n") ==
          "did you mean 'mm'? known here: mm, cm, m, in, ft");
}

TEST_CASE("a unit for a column that is not named may not replace its bracket") {
    CsvLayout layout;
    layout.rain_unit = "in";
    CHECK(problems_in("end [min],depth [mm]\n5,1\n", layout) ==
          R"(gauge.csv:1:11: error: column 'depth [mm]' is in mm, but the scenario gives unit: in
    end [min],depth [mm]
              ^
    leave out unit:, or name the column too, rain: 'depth [mm]', to replace its bracket
)");
    layout = {};
    layout.time_unit = "hr";
    CHECK(problems_in("end [h],depth [mm]\n5,1\n", layout).empty());  // one unit by two names
    layout.time_unit = "h";
    CHECK(problems_in("end [min],depth [mm]\n5,1\n", layout) ==
          R"(gauge.csv:1:1: error: column 'end [min]' is in min, but the scenario gives time_unit: h
    end [min],depth [mm]
    ^
    leave out time_unit:, or name the column too, time: 'end [min]', to replace its bracket
)");
}

}  // namespace rainledger
