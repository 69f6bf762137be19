#include "rainledger/report/hyetograph_csv.hpp"

#include <cstdint>
#include <random>

#include "rainledger/rain/gauge_record.hpp"
#include "rainledger/rain/hyetograph_csv.hpp"
#include "rainledger/rain/rain_events.hpp"
#include "report/sample.hpp"
#include "test.hpp"

namespace rainledger {
namespace {

Hyetograph read_back(const std::string& text) {
    Diagnostics diagnostics;
    auto rain = read_hyetograph_csv("storm.csv", text, {}, diagnostics);
    for (const Diagnostic& diagnostic : diagnostics.list())
        UNSCOPED_INFO(render(diagnostic));
    REQUIRE(rain);
    CHECK(diagnostics.list().empty());
    return *std::move(rain);
}

/// Written, read, and written again: the same steps to the last bit and the same bytes.
void check_identity(const Hyetograph& rain) {
    const std::string text = hyetograph_csv(rain);
    INFO(text.substr(0, 400));
    const Hyetograph back = read_back(text);
    CHECK(back.depth_mm == rain.depth_mm);
    CHECK(back.duration_h == rain.duration_h);
    CHECK(back.edges_h == rain.edges_h);
    CHECK(back.own_steps == rain.own_steps);
    CHECK(back.stamps.has_value() == rain.stamps.has_value());
    if (rain.stamps) {
        CHECK(back.stamps->unix_ms == rain.stamps->unix_ms);
        CHECK(back.stamps->offset_minutes == rain.stamps->offset_minutes);
        CHECK(back.stamps->has_offset == rain.stamps->has_offset);
    }
    CHECK(hyetograph_csv(back) == text);
}

std::vector<double> odd_depths(std::size_t steps) {
    std::mt19937_64 random(20310614);
    std::exponential_distribution<double> depth(0.7);
    std::vector<double> depths;
    for (std::size_t i = 0; i < steps; ++i)
        depths.push_back(depth(random));
    return depths;
}

StampedEdges stamps_from(std::int64_t first_ms, std::int64_t step_ms, std::size_t steps) {
    StampedEdges edges;
    for (std::size_t i = 0; i <= steps; ++i) {
        edges.unix_ms.push_back(first_ms + static_cast<std::int64_t>(i) * step_ms);
        edges.offset_minutes.push_back(0);
    }
    return edges;
}

constexpr std::int64_t kMinuteMs = 60'000;
constexpr std::int64_t kJuneMs = 1'939'045'500'000;  // 2031-06-12 15:45 UTC

}  // namespace

TEST_CASE("a storm of elapsed times is written in the unit in which it was given") {
    const Hyetograph rain = make_hyetograph({0.0, 5.0, 10.0}, "min", {0.4, 12.5});
    CHECK(hyetograph_csv(rain) ==
          "start [min],end [min],depth [mm]\n"
          "0,5,0.4\n"
          "5,10,12.5\n");
}

TEST_CASE("a stamped storm is written with ISO 8601 stamps and their offsets") {
    CHECK(hyetograph_csv(sample::two_stamped_steps()) ==
          "start,end,depth [mm]\n"
          "2026-03-04T23:50:00+01:00,2026-03-04T23:55:00+01:00,0.4\n"
          "2026-03-04T23:55:00+01:00,2026-03-05T00:00:00+01:00,12.5\n");
}

TEST_CASE("dry time appended to a storm is not written") {
    Hyetograph rain = make_hyetograph({0.0, 5.0, 10.0}, "min", {0.4, 12.5});
    const std::string text = hyetograph_csv(rain);
    append_dry_time(rain, 2.0);
    CHECK(hyetograph_csv(rain) == text);
}

TEST_CASE("storms of elapsed times come back from CSV to the last bit") {
    std::vector<double> thirds{0.0};
    for (int i = 1; i <= 24; ++i)
        thirds.push_back(i * 5.0 / 3.0);
    check_identity(make_hyetograph(thirds, "min", odd_depths(24)));
    check_identity(make_hyetograph({0.0, 300.0, 720.0, 1800.5}, "s", odd_depths(3)));
    check_identity(make_hyetograph({-0.5, 0.1, 0.30000000000000004, 7.0}, "h", odd_depths(3)));
    check_identity(make_hyetograph({2.0, 3.5}, "h", {1.0e-17}));
}

TEST_CASE("stamped storms come back from CSV to the last bit") {
    check_identity(sample::two_stamped_steps());
    check_identity(
        make_hyetograph(stamps_from(kJuneMs + 1, 5 * kMinuteMs + 250, 40), odd_depths(40)));
    StampedEdges utc = stamps_from(kJuneMs, kMinuteMs, 30);
    utc.has_offset = true;
    check_identity(make_hyetograph(utc, odd_depths(30)));
    StampedEdges uneven = utc;
    uneven.unix_ms[30] += 17 * kMinuteMs;
    check_identity(make_hyetograph(uneven, odd_depths(30)));
}

TEST_CASE("a storm over a change of clocks comes back from CSV to the last bit") {
    std::string text = "end,depth [mm]\n";
    for (const char* const stamp :
         {"01:40", "02:00", "02:20", "02:40", "02:00", "02:20", "02:40", "03:00", "03:20"})
        text += std::string("2031-10-26T") + stamp + ",1.3\n";
    Diagnostics diagnostics;
    CsvLayout layout;
    layout.zone = "Europe/Madrid";
    const auto rain = read_hyetograph_csv("rain.csv", text, layout, diagnostics);
    REQUIRE(rain);
    CHECK_THAT(hyetograph_csv(*rain), Contains("T02:40:00+02:00,2031-10-26T02:00:00+01:00,1.3\n"));
    check_identity(*rain);
}

TEST_CASE("an event cut out of a tip log comes back from CSV to the last bit") {
    std::string text = "time\n";
    for (const char* const stamp : {"13:45:07", "13:45:31", "13:52:10", "14:31:59", "14:32:00"})
        text += std::string("2031-06-14T") + stamp + "Z\n";
    RecordLayout layout;
    layout.tip_mm = 0.2;
    Diagnostics diagnostics;
    const auto record = read_gauge_record("logger.csv", text, layout, diagnostics);
    REQUIRE(record);
    for (const bool spread : {false, true}) {
        const EventSteps steps{5.0 / 60.0, spread};
        const RecordEvents events = find_events(*record, {}, steps);
        REQUIRE(events.events.size() == 1);
        check_identity(event_rain(*record, events.events[0], {}, steps));
    }
}

}  // namespace rainledger
