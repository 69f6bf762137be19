#include "rain/csv_helpers.hpp"
#include "test.hpp"

namespace rainledger {

TEST_CASE("a file that cannot be a hyetograph is refused") {
    SECTION("empty") {
        CsvLayout layout;
        CHECK(problems_in("", layout) ==
              R"(gauge.csv:1:1: error: the file holds no rows
    a file begins with a row such as 'end [min],depth [mm]', then one row per step
)");
    }
    SECTION("comments only") {
        CsvLayout layout;
        CHECK(problems_in("# nothing\n"
                          "\n",
                          layout) ==
              R"(gauge.csv:1:1: error: the file holds no rows
    # nothing
    ^
    a file begins with a row such as 'end [min],depth [mm]', then one row per step
)");
    }
    SECTION("UTF-16") {
        CsvLayout layout;
        CHECK(problems_in(std::string("\xFF\xFE"
                                      "e\0n\0",
                                      6),
                          layout) ==
              R"(gauge.csv:1:1: error: the file is UTF-16 text
    save it as UTF-8
)");
    }
    SECTION("unknown zone") {
        CsvLayout layout;
        layout.zone = "Europe/Madrit";
        CHECK(problems_in("end,depth [mm]\n"
                          "2026-03-04T10:05,1\n",
                          layout) ==
              R"(gauge.csv:1:1: error: time zone 'Europe/Madrit' is not known here
    end,depth [mm]
    ^
    write a name of the time zone database, such as Europe/Madrid
)");
    }
    SECTION("no rows") {
        CsvLayout layout;
        CHECK(problems_in("end [min],depth [mm]\n"
                          "# none\n",
                          layout) ==
              R"(gauge.csv:1:1: error: there are no rows below the header
    end [min],depth [mm]
    ^
    a file begins with a row such as 'end [min],depth [mm]', then one row per step
)");
    }
    SECTION("every is nothing") {
        CsvLayout layout;
        layout.every_h = 0.0;
        CHECK(problems_in("end [min],depth [mm]\n"
                          "5,1\n",
                          layout) ==
              R"(gauge.csv:1:1: error: every: 0 h is no length of a step
    end [min],depth [mm]
    ^
    state how long each row covers, every: 5 min
)");
    }
}

TEST_CASE("a header that is not understood is refused with the way out") {
    SECTION("no time, no rain") {
        CsvLayout layout;
        CHECK(problems_in("tme [min],rainfall [mm]\n"
                          "5,1\n",
                          layout) ==
              R"(gauge.csv:1:1: error: there is no time column
    tme [min],rainfall [mm]
    ^
    is 'tme [min]' meant to be 'time'? columns here: 'tme [min]', 'rainfall [mm]'; call it 'end [min]', or 'end' for timestamps; or say in the scenario: hyetograph: {file: gauge.csv, time: 'tme [min]', stamp: end, rain: 'rainfall [mm]', kind: depth}
gauge.csv:1:1: error: there is no rain column
    tme [min],rainfall [mm]
    ^
    columns here: 'tme [min]', 'rainfall [mm]'; call it 'depth [mm]', 'intensity [mm/h]' or 'cumulative [mm]'; or say in the scenario: hyetograph: {file: gauge.csv, time: 'tme [min]', stamp: end, rain: 'rainfall [mm]', kind: depth}
)");
    }
    SECTION("round brackets") {
        CsvLayout layout;
        CHECK(problems_in("end (min),depth (mm)\n"
                          "5,1\n",
                          layout) ==
              R"(gauge.csv:1:1: error: there is no time column
    end (min),depth (mm)
    ^
    units stand in square brackets: 'end [min]'; or say in the scenario: hyetograph: {file: gauge.csv, time: 'end (min)', time_unit: min, stamp: end, rain: 'depth (mm)', kind: depth, unit: mm}
gauge.csv:1:1: error: there is no rain column
    end (min),depth (mm)
    ^
    units stand in square brackets: 'depth [mm]'; or say in the scenario: hyetograph: {file: gauge.csv, time: 'end (min)', time_unit: min, stamp: end, rain: 'depth (mm)', kind: depth, unit: mm}
)");
    }
    SECTION("two times") {
        CsvLayout layout;
        CHECK(problems_in("time [min],end [min],depth [mm]\n"
                          "5,1,1\n",
                          layout) ==
              R"(gauge.csv:1:1: error: there are two columns for one time
    time [min],end [min],depth [mm]
    ^
    state which to read in the scenario with time:
)");
    }
    SECTION("meaning of time") {
        CsvLayout layout;
        CHECK(
            problems_in("time [min],depth [mm]\n"
                        "5,1\n",
                        layout) ==
            R"(gauge.csv:1:1: error: it is not stated whether 'time' is the start or the end of a step
    time [min],depth [mm]
    ^
    state it in the scenario with stamp: start or stamp: end, or call the column start or end
)");
    }
    SECTION("rain without unit") {
        CsvLayout layout;
        CHECK(problems_in("end [min],depth\n"
                          "5,1\n",
                          layout) ==
              R"(gauge.csv:1:11: error: column 'depth' has no unit
    end [min],depth
              ^
    write it in brackets, 'depth [mm]' or 'depth [in]', or state unit: mm in the scenario
)");
    }
    SECTION("intensity without unit") {
        CsvLayout layout;
        CHECK(problems_in("end [min],intensity\n"
                          "5,1\n",
                          layout) ==
              R"(gauge.csv:1:11: error: column 'intensity' has no unit
    end [min],intensity
              ^
    write it in brackets, 'intensity [mm/h]' or 'intensity [in/h]', or state unit: mm/h in the scenario
)");
    }
    SECTION("time without unit") {
        CsvLayout layout;
        CHECK(problems_in("end,depth [mm]\n"
                          "5,1\n"
                          "10,2\n",
                          layout) ==
              R"(gauge.csv:1:1: error: column 'end' has no unit, but holds numbers
    end,depth [mm]
    ^
    write the unit of elapsed times in brackets, 'end [min]', or state time_unit: min in the scenario; only timestamps go without
)");
    }
    SECTION("unit of time") {
        CsvLayout layout;
        CHECK(problems_in("end [minutes],depth [mm]\n"
                          "5,1\n",
                          layout) ==
              R"(gauge.csv:1:1: error: 'minutes' is not a unit of time
    end [minutes],depth [mm]
    ^
    known here: s, min, h, hr, d; timestamps take no unit
)");
    }
    SECTION("unit of depth") {
        CsvLayout layout;
        CHECK(problems_in("end [min],depth [mm/h]\n"
                          "5,1\n",
                          layout) ==
              R"(gauge.csv:1:11: error: 'mm/h' is not a unit of depth
    end [min],depth [mm/h]
              ^
    rain in mm/h is called intensity
)");
    }
    SECTION("unit of rain") {
        CsvLayout layout;
        CHECK(problems_in("end [min],depth [litres]\n"
                          "5,1\n",
                          layout) ==
              R"(gauge.csv:1:11: error: 'litres' is not a unit of depth
    end [min],depth [litres]
              ^
    known here: mm, cm, m, in, ft
)");
    }
    SECTION("unit of intensity") {
        CsvLayout layout;
        CHECK(problems_in("end [min],intensity [mm]\n"
                          "5,1\n",
                          layout) ==
              R"(gauge.csv:1:11: error: 'mm' is not a unit of intensity
    end [min],intensity [mm]
              ^
    rain in mm is called depth or cumulative
)");
    }
    SECTION("units of start and end") {
        CsvLayout layout;
        CHECK(problems_in("start [min],end [h],depth [mm]\n"
                          "0,1,1\n",
                          layout) ==
              R"(gauge.csv:1:13: error: start and end are not in the same unit
    start [min],end [h],depth [mm]
                ^
    give both in the same unit, or state which to read in the scenario with time:
)");
    }
    SECTION("two rain columns") {
        CsvLayout layout;
        CHECK(
            problems_in("end [min],depth [mm],cumulative [mm]\n"
                        "5,1,1\n",
                        layout) ==
            R"(gauge.csv:1:22: error: there are two rain columns, 'depth [mm]' and 'cumulative [mm]'
    end [min],depth [mm],cumulative [mm]
                         ^
    state which to read in the scenario with rain:
)");
    }
    SECTION("doubled column") {
        CsvLayout layout;
        CHECK(problems_in("end [min],depth [mm],Depth [in]\n"
                          "5,1,1\n",
                          layout) ==
              R"(gauge.csv:1:22: error: a second column is called 'Depth [in]'
    end [min],depth [mm],Depth [in]
                         ^
    rename one of the two
)");
    }
    SECTION("doubled time column") {
        CsvLayout layout;
        CHECK(problems_in("end [min],end [h],depth [mm]\n"
                          "5,1,1\n",
                          layout) ==
              R"(gauge.csv:1:11: error: a second column is called 'end [h]'
    end [min],end [h],depth [mm]
              ^
    rename one of the two
)");
    }
    SECTION("named column not there") {
        CsvLayout layout;
        layout.time_column = "Date time";
        layout.stamp = StampMeaning::end;
        layout.rain_column = "P(mm)";
        layout.kind = RainKind::depth;
        layout.rain_unit = "mm";
        CHECK(problems_in("Date time,P (mm)\n"
                          "2026-03-04 10:05,1\n",
                          layout) ==
              R"(gauge.csv:1:1: error: there is no column 'P(mm)'
    Date time,P (mm)
    ^
    did you mean 'P (mm)'? columns here: 'Date time', 'P (mm)'
)");
    }
    SECTION("kind missing, stamp missing") {
        CsvLayout layout;
        layout.time_column = "Date time";
        layout.rain_column = "P (mm)";
        layout.rain_unit = "mm";
        CHECK(
            problems_in("Date time,P (mm)\n"
                        "2026-03-04 10:05,1\n",
                        layout) ==
            R"(gauge.csv:1:1: error: it is not stated whether 'Date time' is the start or the end of a step
    Date time,P (mm)
    ^
    state it in the scenario with stamp: start or stamp: end
gauge.csv:1:11: error: it is not stated what kind of rain 'P (mm)' holds
    Date time,P (mm)
              ^
    state it in the scenario with kind: depth, kind: intensity or kind: cumulative
)");
    }
    SECTION("one column for both") {
        CsvLayout layout;
        layout.rain_column = "end [min]";
        layout.kind = RainKind::depth;
        CHECK(problems_in("end [min],depth [mm]\n"
                          "5,1\n",
                          layout) ==
              R"(gauge.csv:1:1: error: this column is named for both time and rain
    end [min],depth [mm]
    ^
    name two different columns under time: and rain:
)");
    }
    SECTION("kind contradicts") {
        CsvLayout layout;
        layout.kind = RainKind::cumulative;
        CHECK(
            problems_in("end [min],depth [mm]\n"
                        "5,1\n",
                        layout) ==
            R"(gauge.csv:1:11: error: column 'depth [mm]' contradicts the scenario's kind: cumulative
    end [min],depth [mm]
              ^
    leave out kind:, or rename the column
)");
    }
    SECTION("stamp contradicts") {
        CsvLayout layout;
        layout.stamp = StampMeaning::start;
        CHECK(problems_in("end [min],depth [mm]\n"
                          "5,1\n",
                          layout) ==
              R"(gauge.csv:1:1: error: column 'end [min]' contradicts the scenario's stamp: start
    end [min],depth [mm]
    ^
    leave out stamp:, or rename the column
)");
    }
    SECTION("every beside start and end") {
        CsvLayout layout;
        layout.every_h = 1.0;
        layout.stamp = StampMeaning::end;
        CHECK(
            problems_in("start [min],end [min],depth [mm]\n"
                        "0,5,1\n",
                        layout) ==
            R"(gauge.csv:1:13: error: the rows give their own start and end, and the scenario gives every: too
    start [min],end [min],depth [mm]
                ^
    leave out every:
gauge.csv:1:13: error: the rows give their own start and end, and the scenario gives stamp: too
    start [min],end [min],depth [mm]
                ^
    leave out stamp:
)");
    }
    SECTION("quote in header") {
        CsvLayout layout;
        CHECK(problems_in("end [min],\"depth [mm]\n"
                          "5,1\n",
                          layout) ==
              R"(gauge.csv:1:11: error: the quote that opens here is not closed on this line
    end [min],"depth [mm]
              ^
    a cell in quotes ends with a quote; a quote inside it is doubled
)");
    }
}

}  // namespace rainledger
