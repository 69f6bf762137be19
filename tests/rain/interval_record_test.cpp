#include <cstddef>
#include <string>
#include <vector>

#include "rain/record_helpers.hpp"

namespace rainledger {
namespace {

using Values = std::vector<double>;
using Steps = std::vector<std::size_t>;

RecordLayout five_minutes() {
    RecordLayout layout;
    layout.csv.every_h = 5.0 / 60.0;
    return layout;
}

}  // namespace

TEST_CASE("interval data: holes and empty cells are steps taken as dry") {
    const GaugeRecord record = clean_record(
        "end,depth [mm]\n"
        "2026-03-04T10:05Z,0.4\n"
        "2026-03-04T10:10Z,\n"
        "2026-03-04T11:10Z,1.2\n"
        "2026-03-04T11:15Z,NA\n"
        "2026-03-04T11:20Z,0\n",
        five_minutes());
    const Hyetograph& rain = steps_of_record(record);
    CHECK(rain.depth_mm == Values{0.4, 0.0, 0.0, 1.2, 0.0, 0.0});
    CHECK(rain.dry_steps == Steps{1, 2, 4});
    CHECK_THAT(rain.taken_as_dry_h, WithinAbs(65.0 / 60.0, 1e-12));
    Hyetograph continued = rain;
    append_dry_time(continued, 1.0);
    CHECK(continued.dry_steps == rain.dry_steps);
    CHECK(record.notes.rows == 5);
    CHECK_THAT(total_depth_mm(record), WithinAbs(1.6, 1e-12));
    CHECK(span_of(record).to_ms - span_of(record).from_ms == 80 * 60'000);
}

TEST_CASE("interval data of elapsed times") {
    const GaugeRecord record = clean_record("end [min],depth [mm]\n5,1\n10,0\n15,2\n", {});
    const Hyetograph& rain = steps_of_record(record);
    CHECK(rain.depth_mm == Values{1.0, 0.0, 2.0});
    CHECK(rain.given.has_value());
    CHECK(rain.dry_steps.empty());
    CHECK(span_of(record).from_ms == 0);
    CHECK(span_of(record).to_ms == 15 * 60'000);
}

TEST_CASE("interval data: headers and overlaps are left out, and other lines keep their numbers") {
    const ReadRecordText read = read_record_text(
        "end,depth [mm]\n"
        "2026-03-04T10:05Z,0.4\n"
        "2026-03-04T10:10Z,0.6\n"
        "2026-03-04T10:15Z,0\n"
        "end,depth [mm]\n"
        "2026-03-04T10:10Z,0.6\n"
        "2026-03-04T10:15Z,0\n"
        "2026-03-04T10:20Z,-1\n",
        five_minutes());
    CHECK(read.report ==
          R"(logger.csv:8:19: error: rain cannot be negative
    2026-03-04T10:20Z,-1
                      ^
    if -1 marks a missing value, state missing: -1 in the scenario
logger.csv:5:1: warning: a header row in the midst is passed over
    end,depth [mm]
    ^
    a logger that starts again, or a second file behind the first, brings its own
logger.csv:6:1: warning: 2 rows from here on repeat earlier ones and are left out
    2026-03-04T10:10Z,0.6
    ^
    downloads of a logger that was not emptied overlap in this way
)");
}

TEST_CASE("interval data: a download that begins with the very last row, and a cut last line") {
    const ReadRecordText read = read_record_text(
        "end,depth [mm]\n"
        "2026-03-04T10:05Z,0.4\n"
        "2026-03-04T10:10Z,0.6\n"
        "2026-03-04T10:10Z,0.6\n"
        "2026-03-04T10:15Z,0.8\n"
        "2026-03-04T10:2",
        five_minutes());
    REQUIRE(read.record.has_value());
    CHECK(steps_of_record(*read.record).depth_mm == Values{0.4, 0.6, 0.8});
    CHECK(read.record->notes.repeated_rows == 1);
    CHECK(read.record->notes.partial_last_line);
    CHECK(read.record->notes.rows == 3);
    CHECK(read.report ==
          R"(logger.csv:4:1: warning: 1 row from here on repeats an earlier one and is left out
    2026-03-04T10:10Z,0.6
    ^
    downloads of a logger that was not emptied overlap in this way
logger.csv:6:1: warning: the last line is cut off and left out
    2026-03-04T10:2
    ^
    a row that is whole ends with a line end
)");
}

TEST_CASE("interval data: last lines without their ends") {
    const auto steps = [](const std::string& text) {
        const ReadRecordText read = read_record_text(text, {});
        REQUIRE(read.record.has_value());
        return steps_of_record(*read.record).steps();
    };
    CHECK(steps("end [min],depth [mm]\n5,1\n10,2\n15,3") == 3);
    CHECK(steps("end [min],depth [mm]\n5,1\n10,2\n15,") == 2);
    CHECK(steps("end [min],depth [mm]\n5,1\n10,2\n15,NA") == 3);
    CHECK(steps("end [min],depth [mm]\n5,1\n10,2\n1") == 2);
    CHECK(steps("depth [mm];end [min]\n1;5\n2;10\n3;15") == 3);
    CHECK(steps("depth [mm];end [min]\n1;5\n2;10\n3;1") == 2);
    CHECK(steps("end [min];depth [mm];note\n5;1;a\n10;2;b\n15;3;\"c") == 2);
}

TEST_CASE("interval data: a clock set back is an error that says so") {
    const ReadRecordText read = read_record_text(
        "end,depth [mm]\n"
        "2026-03-04T10:05Z,0.4\n"
        "2026-03-04T10:10Z,0.6\n"
        "2026-03-04T09:10Z,0.2\n"
        "2026-03-04T09:15Z,0.8\n",
        five_minutes());
    CHECK(
        read.report ==
        R"(logger.csv:4:1: error: time goes back, from 2026-03-04T10:10:00Z to 2026-03-04T09:10:00Z
    2026-03-04T09:10Z,0.2
    ^
    the logger's clock was set back here, or files were put together out of order: correct the times, or keep the rows before and after it as two records; rows that repeat earlier ones up to the last are left out by themselves
)");
    const ReadRecordText same = read_record_text(
        "end,depth [mm]\n2026-03-04T10:05Z,0.4\n2026-03-04T10:05Z,0.6\n", five_minutes());
    CHECK(same.report ==
          R"(logger.csv:3:1: error: the time of the row above comes again, 2026-03-04T10:05:00Z
    2026-03-04T10:05Z,0.6
    ^
    rows must come in the order of time, each time once
)");
}

TEST_CASE("interval data: an overlap of cumulative readings is no fall") {
    RecordLayout layout = five_minutes();
    const ReadRecordText read = read_record_text(
        "end,cumulative [mm]\n"
        "2026-03-04T10:05Z,0\n"
        "2026-03-04T10:10Z,1\n"
        "2026-03-04T10:15Z,3\n"
        "2026-03-04T10:10Z,1\n"
        "2026-03-04T10:15Z,3\n"
        "2026-03-04T10:20Z,3.5\n",
        layout);
    REQUIRE(read.record.has_value());
    CHECK(steps_of_record(*read.record).depth_mm == Values{0.0, 1.0, 2.0, 0.5});
}

TEST_CASE("interval data through the end of summer time") {
    RecordLayout layout;
    layout.csv.zone = "Europe/Madrid";
    layout.csv.every_h = 0.5;
    const GaugeRecord record = clean_record(
        "end,depth [mm]\n2026-10-25 02:00,1\n2026-10-25 02:30,2\n2026-10-25 04:30,3\n", layout);
    CHECK(steps_of_record(record).depth_mm == Values{1.0, 2.0, 0.0, 3.0});
    const GaugeRecord full = clean_record(
        "end,depth [mm]\n2026-10-25 02:30,1\n2026-10-25 02:00,2\n2026-10-25 02:30,3\n", layout);
    CHECK(steps_of_record(full).depth_mm == Values{1.0, 2.0, 3.0});
}

TEST_CASE("what reading a record as a whole refuses") {
    CHECK(read_record_text("\xFF\xFE", {}).report ==
          "logger.csv:1:1: error: the file is UTF-16 text\n    save it as UTF-8\n");
    CHECK_FALSE(read_record_text("", {}).record.has_value());
    CHECK_FALSE(read_record_text("", tip_layout()).record.has_value());
    CHECK(clean_record("\xEF\xBB\xBF"
                       "time\n2026-03-04T10:05Z\n",
                       tip_layout())
              .notes.rows == 1);
}

}  // namespace rainledger
