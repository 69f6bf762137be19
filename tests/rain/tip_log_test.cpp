#include <cstdint>
#include <string>
#include <vector>

#include "rain/record_helpers.hpp"

namespace rainledger {
namespace {

constexpr std::int64_t kMarch4 = 1'772'582'400'000;  // 2026-03-04T00:00Z

/// The minute of the day of each tip, of logs on 4 March 2026.
std::vector<double> minutes(const TipLog& log) {
    std::vector<double> out;
    for (const std::int64_t ms : log.unix_ms)
        out.push_back(static_cast<double>(ms - kMarch4) / 60'000.0);
    return out;
}

using Minutes = std::vector<double>;

}  // namespace

TEST_CASE("a log of bare tips") {
    const GaugeRecord record = clean_record(
        "# invented\n"
        "time\n"
        "2026-03-04T10:05:00Z\n"
        "2026-03-04T10:07:30Z\n"
        "\n"
        "2026-03-04T10:30Z\n",
        tip_layout());
    const TipLog& log = tips_of(record);
    CHECK(minutes(log) == Minutes{605.0, 607.5, 630.0});
    CHECK(log.depth_mm.empty());
    CHECK(log.tip_mm == 0.2);
    CHECK(log.has_offset);
    CHECK(log.offset_minutes == std::vector<std::int16_t>{0, 0, 0});
    CHECK_FALSE(log.clock_assumed);
    CHECK(record.file == "logger.csv");
    CHECK(record.notes.rows == 3);
    CHECK_THAT(total_depth_mm(record), WithinAbs(0.6, 1e-12));
    CHECK(span_of(record).from_ms == kMarch4 + 605 * 60'000);
    CHECK(span_of(record).to_ms == kMarch4 + 630 * 60'000);
}

TEST_CASE("a log without offsets keeps the clock's face, and says so") {
    const GaugeRecord record =
        clean_record("time\n2026-03-04 10:05\n2026-03-04 10:06\n", tip_layout());
    CHECK(minutes(tips_of(record)) == Minutes{605.0, 606.0});
    CHECK_FALSE(tips_of(record).has_offset);
    CHECK(tips_of(record).offset_minutes.empty());
    CHECK(tips_of(record).clock_assumed);
}

TEST_CASE("counts of tips: none, one and several, and columns by name") {
    const GaugeRecord record = clean_record(
        "battery;time;Tips\n"
        "12.5;2026-03-04 10:05;1\n"
        "12.5;2026-03-04 10:10;0\n"
        "12.5;2026-03-04 10:15;\n"
        "12.5;2026-03-04 10:20;NA\n"
        "12.5;2026-03-04 10:25;3\n"
        "12.5;2026-03-04 10:30;1\n",
        tip_layout());
    CHECK(minutes(tips_of(record)) == Minutes{605.0, 625.0, 630.0});
    CHECK(tips_of(record).depth_mm == std::vector<double>{0.2, 3 * 0.2, 0.2});
    CHECK(record.notes.rows == 6);
    CHECK_THAT(total_depth_mm(record), WithinAbs(1.0, 1e-12));

    RecordLayout named = tip_layout();
    named.csv.time_column = "Date time";
    named.csv.rain_column = "N";
    named.csv.missing = "-999";
    const GaugeRecord other = clean_record(
        "N,Date time\n2,2026-03-04 10:05\n-999,2026-03-04 10:06\n-999.0,2026-03-04 10:07\n", named);
    CHECK(minutes(tips_of(other)) == Minutes{605.0});
    CHECK(tips_of(other).depth_mm == std::vector<double>{0.4});
}

TEST_CASE("a running count: the first reading is where it stood before") {
    RecordLayout layout = tip_layout();
    layout.running_count = true;
    const ReadRecordText read = read_record_text(
        "time,count\n"
        "2026-03-04 10:00,120\n"
        "2026-03-04 10:05,120\n"
        "2026-03-04 10:10,123\n"
        "2026-03-04 10:15,\n"
        "2026-03-04 10:20,124\n"
        "2026-03-04 10:25,2\n"
        "2026-03-04 10:30,3\n"
        "2026-03-04 10:35,0\n",
        layout);
    REQUIRE(read.record.has_value());
    CHECK(minutes(tips_of(*read.record)) == Minutes{610.0, 620.0, 625.0, 630.0});
    CHECK(tips_of(*read.record).depth_mm == std::vector<double>{3 * 0.2, 0.2, 2 * 0.2, 0.2});
    CHECK(read.record->notes.counter_restarts == 2);
    CHECK(
        read.report ==
        R"(logger.csv:7:18: warning: the count falls from 124 to 2; the counter is taken to have restarted from 0; 2 times in all
    2026-03-04 10:25,2
                     ^
    what fell between the last reading before and the restart is not known
)");
}

TEST_CASE("two tips in one instant both count") {
    const ReadRecordText read = read_record_text(
        "time\n"
        "2026-03-04T10:05:07Z\n"
        "2026-03-04T10:05:07Z\n"
        "2026-03-04T10:05:08Z\n"
        "2026-03-04T10:05:08Z\n"
        "2026-03-04T10:05:08Z\n",
        tip_layout());
    REQUIRE(read.record.has_value());
    CHECK(tips_of(*read.record).unix_ms.size() == 5);
    CHECK(read.record->notes.same_instant == 3);
    CHECK(
        read.report ==
        R"(logger.csv:3:1: warning: this tip falls at the instant of the one before; both count; 3 times in all
    2026-03-04T10:05:07Z
    ^
    two quick tips within the logger's resolution, or a row written twice: then take one out
)");
}

TEST_CASE("a header row in the midst is passed over, even with a byte-order mark") {
    const ReadRecordText read = read_record_text(
        "time,tips\n"
        "2026-03-04T10:05Z,1\n"
        "time,tips\n"
        "2026-03-04T10:10Z,1\r\n"
        "\xEF\xBB\xBFtime,tips\r\n"
        "2026-03-04T10:15Z,1\n",
        tip_layout());
    REQUIRE(read.record.has_value());
    CHECK(minutes(tips_of(*read.record)) == Minutes{605.0, 610.0, 615.0});
    CHECK(read.record->notes.repeated_headers == 2);
    CHECK(read.record->notes.rows == 3);
    CHECK(read.report ==
          R"(logger.csv:3:1: warning: a header row in the midst is passed over; 2 times in all
    time,tips
    ^
    a logger that starts again, or a second file behind the first, brings its own
)");
}

TEST_CASE("an overlapping download is left out") {
    const std::string first =
        "time\n"
        "2026-03-04T10:05Z\n"
        "2026-03-04T10:10Z\n"
        "2026-03-04T10:10Z\n"
        "2026-03-04T10:15Z\n";
    SECTION("up to the last row, with its own header") {
        const ReadRecordText read = read_record_text(first +
                                                         "time\n"
                                                         "2026-03-04T10:10Z\n"
                                                         "2026-03-04T10:10Z\n"
                                                         "2026-03-04T10:15Z\n"
                                                         "2026-03-04T10:20Z\n",
                                                     tip_layout());
        REQUIRE(read.record.has_value());
        CHECK(minutes(tips_of(*read.record)) == Minutes{605.0, 610.0, 610.0, 615.0, 620.0});
        CHECK(read.record->notes.repeated_rows == 3);
        CHECK(read.record->notes.clock_set_back == 0);
        CHECK(read.record->notes.rows == 5);
        CHECK(
            read.report ==
            R"(logger.csv:4:1: warning: this tip falls at the instant of the one before; both count
    2026-03-04T10:10Z
    ^
    two quick tips within the logger's resolution, or a row written twice: then take one out
logger.csv:6:1: warning: a header row in the midst is passed over
    time
    ^
    a logger that starts again, or a second file behind the first, brings its own
logger.csv:7:1: warning: 3 rows from here on repeat earlier ones and are left out
    2026-03-04T10:10Z
    ^
    downloads of a logger that was not emptied overlap in this way
)");
    }
    SECTION("three downloads, each from the first row on, the last one cut short") {
        const std::string rows =
            "2026-03-04T10:05Z\n"
            "2026-03-04T10:10Z\n";
        const ReadRecordText read = read_record_text("time\n" + rows + "time\n" + rows +
                                                         "2026-03-04T10:15Z\n"
                                                         "time\n" +
                                                         rows,
                                                     tip_layout());
        REQUIRE(read.record.has_value());
        CHECK(minutes(tips_of(*read.record)) == Minutes{605.0, 610.0, 615.0});
        CHECK(read.record->notes.repeated_rows == 4);
        CHECK_THAT(
            read.report,
            Contains(
                R"(logger.csv:5:1: warning: 2 rows from here on repeat earlier ones and are left out; 2 times in all, 4 rows
    2026-03-04T10:05Z
    ^
    downloads of a logger that was not emptied overlap in this way
)"));
    }
    SECTION("of a running count, whose readings fall at its beginning") {
        RecordLayout layout = tip_layout();
        layout.running_count = true;
        const ReadRecordText read = read_record_text(
            "time,count\n"
            "2026-03-04 10:05,5\n"
            "2026-03-04 10:10,7\n"
            "2026-03-04 10:15,8\n"
            "2026-03-04 10:10,7\n"
            "2026-03-04 10:15,8\n"
            "2026-03-04 10:20,9\n",
            layout);
        REQUIRE(read.record.has_value());
        CHECK(read.record->notes.counter_restarts == 0);
        CHECK(read.record->notes.repeated_rows == 2);
        CHECK_THAT(total_depth_mm(*read.record), WithinAbs(4 * 0.2, 1e-12));
    }
    SECTION("of thousands of rows") {
        std::string rows;
        for (int i = 0; i < 5000; ++i) {
            const int day = 1 + i / 1440;
            const int hour = i / 60 % 24;
            const int minute = i % 60;
            const auto two = [](int n) { return (n < 10 ? "0" : "") + std::to_string(n); };
            rows += "2026-03-" + two(day) + "T" + two(hour) + ":" + two(minute) + "Z\n";
        }
        const std::size_t behind = 18 * 2345;
        const ReadRecordText read = read_record_text(
            "time\n" + rows + rows.substr(behind) + "2026-03-05T00:00Z\n", tip_layout());
        REQUIRE(read.record.has_value());
        CHECK(tips_of(*read.record).unix_ms.size() == 5001);
        CHECK(read.record->notes.repeated_rows == 5000 - 2345);
    }
}

TEST_CASE("a clock set back: the tips keep their times and are put in order") {
    SECTION("rows that are new") {
        const ReadRecordText read = read_record_text(
            "time,tips\n"
            "2026-03-04T10:05Z,1\n"
            "2026-03-04T10:20Z,2\n"
            "2026-03-04T10:10Z,3\n"
            "2026-03-04T10:30Z,1\n",
            tip_layout());
        REQUIRE(read.record.has_value());
        CHECK(minutes(tips_of(*read.record)) == Minutes{605.0, 610.0, 620.0, 630.0});
        CHECK(tips_of(*read.record).depth_mm == std::vector<double>{0.2, 3 * 0.2, 2 * 0.2, 0.2});
        CHECK(read.record->notes.clock_set_back == 1);
        CHECK(
            read.report ==
            R"(logger.csv:4:1: warning: time goes back, from 2026-03-04T10:20:00Z to 2026-03-04T10:10:00Z; the tips keep their times and are put in order
    2026-03-04T10:10Z,3
    ^
    the logger's clock was set back, or files were put together out of order; check the times of the rows around here
)");
    }
    SECTION("rows that repeat earlier ones, but not up to the last") {
        const ReadRecordText read = read_record_text(
            "time\n"
            "2026-03-04T10:05Z\n"
            "2026-03-04T10:10Z\n"
            "2026-03-04T10:20Z\n"
            "2026-03-04T10:10Z\n"
            "2026-03-04T10:15Z\n",
            tip_layout());
        REQUIRE(read.record.has_value());
        CHECK(minutes(tips_of(*read.record)) == Minutes{605.0, 610.0, 610.0, 615.0, 620.0});
        CHECK(read.record->notes.clock_set_back == 1);
        CHECK(read.record->notes.repeated_rows == 0);
    }
    SECTION("the newest row first") {
        const ReadRecordText read = read_record_text(
            "time\n2026-03-04T10:15Z\n2026-03-04T10:10Z\n2026-03-04T10:05Z\n", tip_layout());
        REQUIRE(read.record.has_value());
        CHECK(minutes(tips_of(*read.record)) == Minutes{605.0, 610.0, 615.0});
        CHECK(read.record->notes.clock_set_back == 2);
    }
}

TEST_CASE("a last line without its end") {
    const auto dropped = [](const std::string& end, const RecordLayout& layout) {
        const ReadRecordText read = read_record_text(end, layout);
        REQUIRE(read.record.has_value());
        CHECK(read.record->notes.partial_last_line != read.report.empty());
        return read.record->notes.partial_last_line;
    };
    const std::string bare = "time\n2026-03-04T10:05:10Z\n";
    SECTION("is dropped where it makes no row") {
        const ReadRecordText read = read_record_text(bare + "2026-03-04T10:1", tip_layout());
        REQUIRE(read.record.has_value());
        CHECK(tips_of(*read.record).unix_ms.size() == 1);
        CHECK(read.report ==
              R"(logger.csv:3:1: warning: the last line is cut off and left out
    2026-03-04T10:1
    ^
    a row that is whole ends with a line end
)");
    }
    SECTION("is kept where it is whole") {
        CHECK_FALSE(dropped(bare + "2026-03-04T10:07:12Z", tip_layout()));
        CHECK_FALSE(dropped("time,tips\n2026-03-04T10:05Z,1\n2026-03-04T10:06Z,2", tip_layout()));
        CHECK_FALSE(dropped("time,tips\n2026-03-04T10:05Z,1\n2026-03-04T10:06Z,", tip_layout()));
    }
    SECTION("is dropped where its time may have lost its end") {
        CHECK(dropped(bare + "2026-03-04T10:07", tip_layout()));
        CHECK(dropped("time\n2026-03-04 10:05:10\n2026-03-04 10:07", tip_layout()));
        CHECK(dropped("time\n2026-03-04 10:05:10.5\n2026-03-04 10:07:12", tip_layout()));
        CHECK(dropped("time\n2026-03-04T10:05:10+01:00\n2026-03-04T10:07:12+01", tip_layout()));
    }
    SECTION("is dropped where cells are missing, or it is damaged") {
        CHECK(dropped("time,tips\n2026-03-04T10:05Z,1\n2026-03-04T10:06Z", tip_layout()));
        CHECK(dropped(bare + std::string("2026-03\0\0\0", 10), tip_layout()));
    }
    SECTION("says nothing where it is a note or blank") {
        CHECK_FALSE(dropped(bare + "# end", tip_layout()));
        CHECK_FALSE(dropped(bare + "   ", tip_layout()));
    }
}

TEST_CASE("a zone tells the two readings of an hour apart") {
    RecordLayout layout = tip_layout();
    layout.csv.zone = "Europe/Madrid";
    // Clocks go back from 03:00 to 02:00 summer time's end on 25 October 2026.
    const GaugeRecord record = clean_record(
        "time\n2026-10-25 02:40\n2026-10-25 02:50\n2026-10-25 02:10\n2026-10-25 02:30\n"
        "2026-10-25 03:05\n",
        layout);
    const TipLog& log = tips_of(record);
    CHECK(log.offset_minutes == std::vector<std::int16_t>{120, 120, 60, 60, 60});
    std::vector<std::int64_t> since;
    for (const std::int64_t ms : log.unix_ms)
        since.push_back((ms - log.unix_ms.front()) / 60'000);
    CHECK(since == std::vector<std::int64_t>{0, 10, 30, 50, 85});
    CHECK(log.has_offset);
    CHECK_FALSE(log.clock_assumed);
}

TEST_CASE("an overlap behind the hour that comes twice is found all the same") {
    RecordLayout layout = tip_layout();
    layout.csv.zone = "Europe/Madrid";
    const ReadRecordText read = read_record_text(
        "time\n2026-10-25 01:40\n2026-10-25 02:50\n2026-10-25 02:10\n2026-10-25 04:30\n"
        "2026-10-25 02:50\n2026-10-25 02:10\n2026-10-25 04:30\n2026-10-25 05:00\n",
        layout);
    REQUIRE(read.record.has_value());
    CHECK(read.record->notes.repeated_rows == 3);
    CHECK(read.record->notes.clock_set_back == 0);
    CHECK(tips_of(*read.record).unix_ms.size() == 5);
}

}  // namespace rainledger
