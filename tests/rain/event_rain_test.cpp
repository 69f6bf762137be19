#include <cmath>
#include <cstdint>
#include <string>
#include <vector>

#include "rain/record_helpers.hpp"
#include "rainledger/rain/rain_events.hpp"

namespace rainledger {
namespace {

using Values = std::vector<double>;

std::vector<std::string> stamps_of(const Hyetograph& rain) {
    std::vector<std::string> out;
    for (std::size_t i = 0; i <= rain.steps(); ++i)
        out.push_back(iso_stamp(*rain.stamps, i));
    return out;
}

void check_depths(const Hyetograph& rain, const Values& depth_mm) {
    REQUIRE(rain.depth_mm.size() == depth_mm.size());
    for (std::size_t i = 0; i < depth_mm.size(); ++i) {
        CAPTURE(i);
        CHECK_THAT(rain.depth_mm[i], WithinAbs(depth_mm[i], 1e-12));
    }
}

/// The rain of a record's only event.
Hyetograph only_event(const GaugeRecord& record, const EventSteps& steps) {
    const RecordEvents found = find_events(record, {}, steps);
    REQUIRE(found.events.size() == 1);
    return event_rain(record, found.events[0], {}, steps);
}

}  // namespace

TEST_CASE("tips fall in the step that holds them, and on an edge in the one that ends there") {
    const GaugeRecord record = clean_record(
        "time\n"
        "2031-06-14T10:05:00Z\n"
        "2031-06-14T10:05:00.001Z\n"
        "2031-06-14T10:07:00Z\n"
        "2031-06-14T10:20:00Z\n",
        tip_layout());
    const Hyetograph rain = only_event(record, {});
    check_depths(rain, {0.2, 0.4, 0.0, 0.2});
    CHECK(stamps_of(rain) ==
          std::vector<std::string>{"2031-06-14T10:00:00Z", "2031-06-14T10:05:00Z",
                                   "2031-06-14T10:10:00Z", "2031-06-14T10:15:00Z",
                                   "2031-06-14T10:20:00Z"});
    CHECK(rain.own_steps == 4);
    CHECK_FALSE(rain.clock_assumed);
    CHECK(rain.dry_steps.empty());
}

TEST_CASE("steps count from the midnight of the gauge's clock before the first tip") {
    const EventSteps seven{7.0 / 60.0, false};
    const GaugeRecord record = clean_record("time\n2031-06-14T00:10+01:30\n", tip_layout());
    CHECK(stamps_of(only_event(record, seven)) ==
          std::vector<std::string>{"2031-06-14T00:07:00+01:30", "2031-06-14T00:14:00+01:30"});
    const GaugeRecord midnight = clean_record("time\n2031-06-14 00:00\n", tip_layout());
    const Hyetograph rain = only_event(midnight, {});
    CHECK(stamps_of(rain) ==
          std::vector<std::string>{"2031-06-13T23:55:00", "2031-06-14T00:00:00"});
    CHECK(rain.clock_assumed);
}

TEST_CASE("tips are spread since the tip before") {
    const EventSteps spread{5.0 / 60.0, true};
    SECTION("the first as long as the second, over edges by their shares") {
        const GaugeRecord record = clean_record(
            "time\n2031-06-14T10:12Z\n2031-06-14T10:20Z\n2031-06-14T10:21Z\n", tip_layout());
        const Hyetograph rain = only_event(record, spread);
        CHECK(stamps_of(rain).front() == "2031-06-14T10:00:00Z");
        check_depths(rain, {0.2 / 8, 0.2 * 5 / 8, 0.2 * 2 / 8 + 0.2 * 3 / 8, 0.2 * 5 / 8, 0.2});
    }
    SECTION("a lone one over a step, tips of one instant as one") {
        Diagnostics diagnostics;
        const auto record =
            read_gauge_record("logger.csv", "time\n2031-06-14T10:12Z\n2031-06-14T10:12Z\n",
                              tip_layout(), diagnostics);
        REQUIRE(record.has_value());
        check_depths(only_event(*record, spread), {0.4 * 3 / 5, 0.4 * 2 / 5});
    }
    SECTION("never longer than the dry spell") {
        const GaugeRecord record = clean_record("time\n2031-06-14T10:00Z\n", tip_layout());
        const EventRule rule{0.5, 0.0};
        const EventSteps hourly{1.0, true};
        const RecordEvents found = find_events(record, rule, hourly);
        check_depths(event_rain(record, found.events[0], rule, hourly), {0.2});
    }
    SECTION("peaks of the event are those of its spread rain") {
        const GaugeRecord record = clean_record(
            "time\n2031-06-14T10:00Z\n2031-06-14T11:00Z\n2031-06-14T12:00Z\n", tip_layout());
        const RecordEvents found = find_events(record, {}, spread);
        REQUIRE(found.events.size() == 1);
        CHECK_THAT(found.events[0].peak_mm[0], WithinAbs(0.2 / 12, 1e-12));
        CHECK_THAT(found.events[0].peak_mm[4], WithinAbs(0.2, 1e-12));
        CHECK_THAT(found.events[0].peak_mm[5], WithinAbs(0.6, 1e-12));
        CHECK(steps_of(record, found.events[0], spread) == 36);
    }
}

TEST_CASE("an event through the end of summer time keeps its offsets") {
    RecordLayout layout = tip_layout();
    layout.csv.zone = "Europe/Madrid";
    const GaugeRecord record = clean_record(
        "time\n2026-10-25 02:40\n2026-10-25 02:50\n2026-10-25 02:10\n2026-10-25 03:05\n", layout);
    const EventSteps steps{0.25, false};
    const Hyetograph rain = only_event(record, steps);
    check_depths(rain, {0.2, 0.2, 0.2, 0.0, 0.0, 0.0, 0.2});
    CHECK(stamps_of(rain) ==
          std::vector<std::string>{"2026-10-25T02:30:00+02:00", "2026-10-25T02:45:00+02:00",
                                   "2026-10-25T03:00:00+02:00", "2026-10-25T02:15:00+01:00",
                                   "2026-10-25T02:30:00+01:00", "2026-10-25T02:45:00+01:00",
                                   "2026-10-25T03:00:00+01:00", "2026-10-25T03:15:00+01:00"});
    for (const double hours : rain.duration_h)
        CHECK(hours == 0.25);
}

TEST_CASE("interval data keep their own steps, stamps and what was taken as dry") {
    RecordLayout layout;
    layout.csv.every_h = 5.0 / 60.0;
    const GaugeRecord record = clean_record(
        "end,depth [mm]\n"
        "2031-06-14 10:00,\n"
        "2031-06-14 10:05,1\n"
        "2031-06-14 10:10,\n"
        "2031-06-14 10:25,2\n"
        "2031-06-14 10:30,\n",
        layout);
    const Hyetograph rain = only_event(record, {});
    CHECK(rain.depth_mm == Values{1.0, 0.0, 0.0, 2.0});
    CHECK(stamps_of(rain).front() == "2031-06-14T10:00:00");
    CHECK(stamps_of(rain).back() == "2031-06-14T10:25:00");
    CHECK(rain.dry_steps == std::vector<std::size_t>{1, 2});
    CHECK_THAT(rain.taken_as_dry_h, WithinAbs(0.25, 1e-12));
    CHECK(rain.clock_assumed);
}

TEST_CASE("interval data of elapsed times keep them") {
    const GaugeRecord record =
        clean_record("end [min],depth [mm]\n5,0\n10,1\n15,0\n20,2\n25,0\n", {});
    const Hyetograph rain = only_event(record, {});
    CHECK(rain.depth_mm == Values{1.0, 0.0, 2.0});
    REQUIRE(rain.given.has_value());
    CHECK(rain.given->value == Values{5.0, 10.0, 15.0, 20.0});
    CHECK(rain.given->unit == "min");
}

TEST_CASE("rain between two instants, whatever the dry spells") {
    constexpr std::int64_t kTen = 1'939'161'600'000 + 10 * 3'600'000;
    constexpr std::int64_t kMinute = 60'000;
    const GaugeRecord record = clean_record(
        "time\n2031-06-14T09:00Z\n2031-06-14T10:02Z\n2031-06-14T10:03Z\n2031-06-14T19:00Z\n",
        tip_layout());
    SECTION("moved outward to edges, with the dry time at both ends") {
        const auto cut = rain_between(record, kTen - 2 * kMinute, kTen + 11 * kMinute, {});
        REQUIRE(cut.has_value());
        check_depths(cut->rain, {0.0, 0.4, 0.0, 0.0});
        CHECK(cut->event.from_ms == kTen - 5 * kMinute);
        CHECK(cut->event.to_ms == kTen + 15 * kMinute);
        CHECK(cut->event.number == 0);
        CHECK_THAT(cut->event.depth_mm, WithinAbs(0.4, 1e-12));
        CHECK_THAT(cut->event.peak_mm[0], WithinAbs(0.4, 1e-12));
        CHECK_THAT(cut->event.antecedent_5_day_mm, WithinAbs(0.2, 1e-12));
        CHECK(steps_between(record, kTen - 2 * kMinute, kTen + 11 * kMinute, {}) == 4);
    }
    SECTION("cut to the record") {
        const auto cut = rain_between(record, kTen - 3000 * kMinute, kTen + 3000 * kMinute, {});
        REQUIRE(cut.has_value());
        CHECK(stamps_of(cut->rain).front() == "2031-06-14T08:55:00Z");
        CHECK(stamps_of(cut->rain).back() == "2031-06-14T19:00:00Z");
        CHECK_THAT(cut->event.depth_mm, WithinAbs(0.8, 1e-12));
    }
    SECTION("dry") {
        const auto cut = rain_between(record, kTen + 60 * kMinute, kTen + 70 * kMinute, {});
        REQUIRE(cut.has_value());
        check_depths(cut->rain, {0.0, 0.0});
        CHECK(cut->event.depth_mm == 0.0);
        CHECK(cut->event.peak_mm[5] == 0.0);
    }
    SECTION("spread no further back than the first edge") {
        const EventSteps spread{5.0 / 60.0, true};
        const auto cut = rain_between(record, kTen, kTen + 600 * kMinute, spread);
        REQUIRE(cut.has_value());
        CHECK(cut->event.from_ms == kTen);
        CHECK_THAT(total_depth_mm(cut->rain), WithinAbs(0.6, 1e-12));
        // The last tip is spread over the six hours of the dry spell.
        CHECK_THAT(cut->rain.depth_mm.back(), WithinAbs(0.2 / 72, 1e-12));
    }
    SECTION("outside the record") {
        CHECK_FALSE(rain_between(record, kTen + 900 * kMinute, kTen + 910 * kMinute, {}));
        CHECK_FALSE(rain_between(record, kTen - 900 * kMinute, kTen - 890 * kMinute, {}));
        CHECK(steps_between(record, kTen - 900 * kMinute, kTen - 890 * kMinute, {}) == 0);
    }
    SECTION("of interval data") {
        const GaugeRecord steps = clean_record("end [min],depth [mm]\n5,1\n10,0\n15,2\n20,4\n", {});
        const auto cut = rain_between(steps, 7 * kMinute, 15 * kMinute, {});
        REQUIRE(cut.has_value());
        CHECK(cut->rain.depth_mm == Values{0.0, 2.0});
        CHECK(cut->event.depth_mm == 2.0);
        CHECK(cut->event.antecedent_5_day_mm == 1.0);
        CHECK(steps_between(steps, 7 * kMinute, 15 * kMinute, {}) == 2);
        CHECK_FALSE(rain_between(steps, 20 * kMinute, 25 * kMinute, {}));
    }
}

TEST_CASE("a stretch of interval data begins and ends within what was taken as dry") {
    constexpr std::int64_t kMidnight = 1'939'161'600'000;
    constexpr std::int64_t kHour = 3'600'000;
    RecordLayout layout;
    layout.csv.every_h = 1.0;
    const GaugeRecord record = clean_record(
        "start,depth [mm]\n"
        "2031-06-14 00:00+01:00,1\n"
        "2031-06-14 22:00+02:00,2\n"
        "2031-06-14 23:00+02:00,4\n"
        "2031-06-17 00:00+02:00,8\n",
        layout);
    SECTION("at both ends") {
        const auto cut = rain_between(record, kMidnight + 18 * kHour, kMidnight + 23 * kHour, {});
        REQUIRE(cut.has_value());
        CHECK(stamps_of(cut->rain) ==
              std::vector<std::string>{"2031-06-14T19:00:00+01:00", "2031-06-14T22:00:00+02:00",
                                       "2031-06-14T23:00:00+02:00", "2031-06-15T00:00:00+02:00",
                                       "2031-06-15T01:00:00+02:00"});
        CHECK(cut->rain.duration_h == Values{2.0, 1.0, 1.0, 1.0});
        CHECK(cut->rain.edges_h == Values{0.0, 2.0, 3.0, 4.0, 5.0});
        CHECK(cut->rain.depth_mm == Values{0.0, 2.0, 4.0, 0.0});
        CHECK(cut->rain.dry_steps == std::vector<std::size_t>{0, 3});
        CHECK(cut->rain.taken_as_dry_h == 3.0);
        CHECK(cut->event.from_ms == kMidnight + 18 * kHour);
        CHECK(cut->event.to_ms == kMidnight + 23 * kHour);
        CHECK(cut->event.without_data_h == 3.0);
        CHECK(cut->event.depth_mm == 6.0);
        CHECK(cut->event.peak_mm[4] == 4.0);
        CHECK(cut->event.antecedent_5_day_mm == 1.0);
        CHECK(cut->event.first == 1);
        CHECK(cut->event.end == 5);
        CHECK(steps_between(record, kMidnight + 18 * kHour, kMidnight + 23 * kHour, {}) == 4);
    }
    SECTION("within one hole") {
        const auto cut = rain_between(record, kMidnight + 30 * kHour, kMidnight + 31 * kHour, {});
        REQUIRE(cut.has_value());
        CHECK(stamps_of(cut->rain) ==
              std::vector<std::string>{"2031-06-15T08:00:00+02:00", "2031-06-15T09:00:00+02:00"});
        CHECK(cut->rain.taken_as_dry_h == 1.0);
        CHECK(cut->event.without_data_h == 1.0);
        CHECK(cut->event.depth_mm == 0.0);
    }
    SECTION("a step with data is not parted, and a hole not beyond its own edges") {
        const auto cut = rain_between(record, kMidnight + kHour / 2 - kHour,
                                      kMidnight + 20 * kHour + kHour / 2, {});
        REQUIRE(cut.has_value());
        CHECK(stamps_of(cut->rain) ==
              std::vector<std::string>{"2031-06-14T00:00:00+01:00", "2031-06-14T01:00:00+01:00",
                                       "2031-06-14T22:00:00+02:00", "2031-06-14T23:00:00+02:00"});
        CHECK(cut->rain.taken_as_dry_h == 20.0);
    }
    SECTION("of elapsed times") {
        RecordLayout minutes;
        minutes.csv.every_h = 5.0 / 60.0;
        const GaugeRecord elapsed = clean_record("start [min],depth [mm]\n0,1\n600,2\n", minutes);
        const auto cut = rain_between(elapsed, 9 * kHour, 11 * kHour, {});
        REQUIRE(cut.has_value());
        CHECK(cut->rain.given->value == Values{540.0, 600.0, 605.0});
        CHECK(cut->rain.depth_mm == Values{0.0, 2.0});
        CHECK(cut->event.from_ms == 9 * kHour);
        CHECK(cut->event.without_data_h == 1.0);
    }
}

TEST_CASE("steps too short for an event are counted, not made") {
    std::string text = "time\n";
    for (int day = 10; day < 30; ++day)
        for (int hour = 10; hour < 24; hour += 3)
            text += "2031-06-" + std::to_string(day) + "T" + std::to_string(hour) + ":00Z\n";
    const GaugeRecord record = clean_record(text, tip_layout());
    const EventRule rule{24.0, 0.0};
    const EventSteps tiny{1.0 / 3.6e6, GENERATE(false, true)};
    const RecordEvents found = find_events(record, rule, tiny);
    REQUIRE(found.events.size() == 1);
    CHECK(steps_of(record, found.events[0], tiny) > kMostEventSteps);
    // Five tips a day; spread, the first takes three hours and the next day's first twelve.
    CHECK_THAT(found.events[0].peak_mm[5], WithinAbs(tiny.spread_tips ? 1.15 : 1.0, 1e-6));
}

}  // namespace rainledger
