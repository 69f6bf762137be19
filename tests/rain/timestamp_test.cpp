#include "rainledger/rain/timestamp.hpp"

#include "rainledger/rain/hyetograph_csv.hpp"
#include "test.hpp"

namespace rainledger {
namespace {

constexpr std::int64_t kHour = 3'600'000;

std::int64_t utc(const char* text) {
    const ParsedStamp stamp = parse_stamp(text);
    INFO(text);
    REQUIRE(stamp.value.has_value());
    return stamp.value->unix_ms();
}

}  // namespace

TEST_CASE("every accepted way of writing a timestamp") {
    // 2026-03-04 10:05 UTC is 20,516 days and 10:05 h after the epoch.
    const std::int64_t expected = 20'516 * 24 * kHour + 10 * kHour + 300'000;
    for (const char* text :
         {"2026-03-04T10:05", "2026-03-04 10:05", "2026-03-04T10:05:00", "2026-03-04T10:05:00.0",
          "2026-03-04T10:05:00.00", "2026-03-04 10:05:00.000", "2026-03-04T10:05Z",
          "2026-03-04T10:05:00Z", "2026-03-04T11:05+01:00", "2026-03-04T11:05+0100",
          "2026-03-04T11:05+01", "2026-03-04T06:35-03:30", "2026-03-04T10:05-00:00",
          "2026-03-05T04:05:00.000+18:00"})
        CHECK(utc(text) == expected);
    CHECK(utc("2026-03-04T10:05:00.5") == expected + 500);
    CHECK(utc("2026-03-04T10:05:00.25") == expected + 250);
    CHECK(utc("2026-03-04T10:05:07.125") == expected + 7125);
    CHECK(utc("1969-12-31T23:59:59.999Z") == -1);
    CHECK(utc("2024-02-29T00:00") == utc("2024-02-28T00:00") + 24 * kHour);
}

TEST_CASE("24:00 is midnight of the next day") {
    CHECK(utc("2026-12-31T24:00") == utc("2027-01-01T00:00"));
    CHECK(utc("2026-12-31T24:00:00.0+01:00") == utc("2027-01-01T00:00:00+01:00"));
}

TEST_CASE("whether an offset was written is kept") {
    CHECK(parse_stamp("2026-03-04T10:05Z").value->has_offset);
    CHECK(parse_stamp("2026-03-04T10:05-03:30").value->offset_minutes == -210);
    CHECK_FALSE(parse_stamp("2026-03-04T10:05").value->has_offset);
}

TEST_CASE("anything else is not a timestamp") {
    for (const char* text : {"",
                             "2026-03-04",
                             "2026-03-04T",
                             "2026-03-04T10",
                             "2026-03-04T10:",
                             "2026-03-04T10:05:",
                             "2026-3-4 10:05",
                             "2026-03-04  10:05",
                             "2026-03-04t10:05",
                             " 2026-03-04T10:05",
                             "2026-03-04T10:05 ",
                             "2026-03-04T10:05:00.",
                             "2026-03-04T10:05:00.1234",
                             "2026-03-04T10:05:00,5",
                             "2026-03-04T10:05z",
                             "2026-03-04T10:05+1",
                             "2026-03-04T10:05+",
                             "2026-03-04T10:05+01:",
                             "2026-03-04T10:05+01:0",
                             "2026-03-04T10:05+01:000",
                             "2026-03-04T10:05 +01:00",
                             "20260304T1005",
                             "04/03/2026 10:05",
                             "12026-03-04T10:05",
                             "-2026-03-04T10:05",
                             "2026-03-04T1o:05",
                             "2026-03-04T10:05xyz",
                             "2026-03-04T10.05"}) {
        const ParsedStamp stamp = parse_stamp(text);
        CHECK_FALSE(stamp.value.has_value());
        CHECK(stamp.problem == "'" + std::string(text) + "' is not a timestamp");
        CHECK(stamp.hint == "write 2026-03-04T10:05 or 2026-03-04 10:05:00+01:00");
    }
}

TEST_CASE("dates, times and offsets that cannot be are refused") {
    for (const char* text : {"2026-02-29T10:05", "2026-04-31T10:05", "2026-00-10T10:05",
                             "2026-13-10T10:05", "2026-01-00T10:05", "0000-01-01T10:05"})
        CHECK(parse_stamp(text).problem ==
              "'" + std::string(text) + "' is no date of the calendar");
    for (const char* text : {"2026-03-04T10:60", "2026-03-04T25:00", "2026-03-04T10:05:60",
                             "2026-03-04T24:01", "2026-03-04T24:00:00.001"})
        CHECK(parse_stamp(text).problem == "'" + std::string(text) + "' is no time of the day");
    for (const char* text :
         {"2026-03-04T10:05+18:01", "2026-03-04T10:05-19", "2026-03-04T10:05+01:60"})
        CHECK(parse_stamp(text).problem ==
              "'" + std::string(text) + "' has an impossible UTC offset");
    CHECK(parse_stamp("2026-02-29T10:05").hint == "that month ends on day 28");
}

TEST_CASE("a zone knows when its clocks change") {
    // Directive 2000/84/EC: clocks change at 01:00 UTC on the last Sundays of March and October.
    auto madrid = Zone::find("Europe/Madrid");
    REQUIRE(madrid.has_value());
    CHECK(madrid->offset_minutes(utc("2026-03-29T00:59:59.999Z")) == 60);
    CHECK(madrid->offset_minutes(utc("2026-03-29T01:00Z")) == 120);
    CHECK(madrid->offset_minutes(utc("2026-10-25T00:59Z")) == 120);
    CHECK(madrid->offset_minutes(utc("2026-10-25T01:00Z")) == 60);
}

TEST_CASE("a reading becomes the earliest instant that is not too early") {
    auto madrid = Zone::find("Europe/Madrid");
    REQUIRE(madrid.has_value());
    const std::int64_t face = utc("2026-10-25T02:30");
    const std::int64_t summer = utc("2026-10-25T02:30+02:00");
    CHECK(madrid->instant(face, std::nullopt) == summer);
    CHECK(madrid->instant(face, summer) == summer);
    CHECK(madrid->instant(face, summer + 1) == summer + kHour);
    CHECK(madrid->instant(face, summer + 2 * kHour) == summer + kHour);
    CHECK(madrid->instant(utc("2026-10-25T03:00"), summer) == utc("2026-10-25T03:00+01:00"));
    CHECK(madrid->instant(utc("2026-10-25T01:59"), {}) == utc("2026-10-25T01:59+02:00"));
}

TEST_CASE("a reading that the clocks skip is no instant") {
    auto madrid = Zone::find("Europe/Madrid");
    REQUIRE(madrid.has_value());
    CHECK_FALSE(madrid->instant(utc("2026-03-29T02:00"), {}).has_value());
    CHECK_FALSE(madrid->instant(utc("2026-03-29T02:59:59.999"), {}).has_value());
    CHECK(madrid->instant(utc("2026-03-29T03:00"), {}) == utc("2026-03-29T01:00Z"));
    CHECK(madrid->instant(utc("2026-03-29T01:59"), {}) == utc("2026-03-29T00:59Z"));
}

TEST_CASE("far from any change, and in zones without changes, the offset is plain") {
    auto madrid = Zone::find("Europe/Madrid");
    auto universal = Zone::find("Etc/UTC");
    REQUIRE(madrid.has_value());
    REQUIRE(universal.has_value());
    CHECK(madrid->instant(utc("2026-07-01T12:00"), {}) == utc("2026-07-01T10:00Z"));
    CHECK(madrid->instant(utc("2026-01-15T12:00"), {}) == utc("2026-01-15T11:00Z"));
    CHECK(universal->instant(utc("2026-07-01T12:00"), {}) == utc("2026-07-01T12:00Z"));
}

TEST_CASE("unknown zones are told without a fuss") {
    CHECK(is_known_zone("Europe/Madrid"));
    for (const char* name : {"", "Europe/Madrit", "europe/madrid ", "../../etc/passwd", "+01:00"})
        CHECK_FALSE(is_known_zone(name));
}

}  // namespace rainledger
