#include "rainledger/rain/rain_events.hpp"

#include <cstddef>
#include <cstdint>
#include <vector>

#include "rain/event_helpers.hpp"
#include "rain/record_helpers.hpp"
#include "rain/synthetic_logger.hpp"

namespace rainledger {
namespace {

constexpr double kHour_ms = 3.6e6;

}  // namespace

TEST_CASE("events of tips are parted by dry spells") {
    const GaugeRecord record = log_at({62, 64, 70, 430, 431, 1000});
    const RecordEvents found = find_events(record, {}, {});
    CHECK(ranges_of(found) == Ranges{{0, 3}, {3, 5}, {5, 6}});
    CHECK(found.outside_mm == 0.0);
    const RainEvent& first = found.events[0];
    CHECK(first.number == 1);
    CHECK(minute_of(first.from_ms) == 60.0);
    CHECK(minute_of(first.to_ms) == 70.0);
    CHECK_THAT(first.depth_mm, WithinAbs(0.6, 1e-12));
    CHECK_THAT(first.peak_mm[0], WithinAbs(0.4, 1e-12));
    CHECK_THAT(first.peak_mm[1], WithinAbs(0.6, 1e-12));
    CHECK_THAT(first.peak_mm[5], WithinAbs(0.6, 1e-12));
    CHECK(first.antecedent_5_day_mm == 0.0);
    CHECK_FALSE(first.antecedent_known);
    CHECK_THAT(found.events[2].antecedent_5_day_mm, WithinAbs(1.0, 1e-12));
}

TEST_CASE("a dry spell may be just as long as asked") {
    CHECK(ranges_of(find_events(log_at({0, 360}), {}, {})) == Ranges{{0, 1}, {1, 2}});
    CHECK(ranges_of(find_events(log_at({0, 359.99}), {}, {})) == Ranges{{0, 2}});
}

TEST_CASE("events of interval data run from their first wet step to their last") {
    RecordLayout layout;
    layout.csv.every_h = 0.5;
    const GaugeRecord record = clean_record(
        "start,depth [mm]\n"
        "2031-06-14T00:00+02:00,0\n"
        "2031-06-14T00:30+02:00,1\n"
        "2031-06-14T01:00+02:00,\n"
        "2031-06-14T01:30+02:00,3\n"
        "2031-06-14T02:00+02:00,0\n"
        "2031-06-14T10:00+02:00,0.1\n"
        "2031-06-14T20:00+02:00,2\n",
        layout);
    const RecordEvents found = find_events(record, {}, {});
    REQUIRE(found.events.size() == 3);
    const RainEvent& first = found.events[0];
    CHECK(first.first == 1);
    CHECK(first.end == 4);
    CHECK(first.depth_mm == 4.0);
    CHECK(first.without_data_h == 0.5);
    CHECK_THAT(first.peak_mm[0], WithinAbs(0.5, 1e-12));
    CHECK_THAT(first.peak_mm[4], WithinAbs(3.0, 1e-12));
    CHECK(first.peak_mm[5] == 4.0);
    CHECK((first.to_ms - first.from_ms) == 90 * 60'000);
    CHECK_THAT(found.events[2].antecedent_5_day_mm, WithinAbs(4.1, 1e-12));
    const RecordEvents without_drizzle = find_events(record, {6.0, 0.2}, {});
    CHECK(without_drizzle.events.size() == 2);
    CHECK_THAT(without_drizzle.outside_mm, WithinAbs(0.1, 1e-12));
}

TEST_CASE("the five days before an event take the share of a step that lies in them") {
    RecordLayout layout;
    layout.csv.every_h = 1.0;
    const GaugeRecord record = clean_record("end [h],depth [mm]\n1,6\n2,4\n3,2\n122.5,1\n", layout);
    const RecordEvents found = find_events(record, {}, {});
    REQUIRE(found.events.size() == 2);
    // From 1.5 h to 121.5 h: half of the second step, and the third.
    CHECK_THAT(found.events[1].antecedent_5_day_mm, WithinAbs(4.0, 1e-12));
    CHECK(found.events[1].antecedent_known);
    CHECK_FALSE(found.events[0].antecedent_known);
}

TEST_CASE("a record cut in two anywhere keeps all rain, and at any time without rain all events") {
    const std::vector<std::int64_t> seconds = year_of_tips(7);
    std::vector<double> minutes;
    for (const std::int64_t s : seconds)
        minutes.push_back(static_cast<double>(s - seconds.front()) / 60.0);
    const EventRule rule{6.0, GENERATE(0.0, 0.7, 2.1)};
    const GaugeRecord record = log_at(minutes);
    const RecordEvents whole = find_events(record, rule, {});
    REQUIRE(whole.events.size() > 10);
    for (std::size_t cut = 1; cut < minutes.size(); ++cut) {
        const bool without_rain = minutes[cut] - minutes[cut - 1] >= 360.0;
        if (!without_rain && cut % 10 != 0) continue;
        const auto middle = minutes.begin() + static_cast<std::ptrdiff_t>(cut);
        const RecordEvents before = find_events(log_at({minutes.begin(), middle}), rule, {});
        const RecordEvents after = find_events(log_at({middle, minutes.end()}), rule, {});
        std::vector<RainEvent> both = before.events;
        both.insert(both.end(), after.events.begin(), after.events.end());
        CAPTURE(cut);
        double all_mm = before.outside_mm + after.outside_mm;
        for (const RainEvent& event : both)
            all_mm += event.depth_mm;
        REQUIRE_THAT(all_mm, WithinAbs(total_depth_mm(record), 1e-9));
        if (!without_rain) continue;
        REQUIRE(both.size() == whole.events.size());
        REQUIRE_THAT(before.outside_mm + after.outside_mm, WithinAbs(whole.outside_mm, 1e-9));
        for (std::size_t i = 0; i < both.size(); ++i) {
            REQUIRE(both[i].from_ms == whole.events[i].from_ms);
            REQUIRE(both[i].to_ms == whole.events[i].to_ms);
            REQUIRE(both[i].depth_mm == whole.events[i].depth_mm);
            REQUIRE(both[i].peak_mm == whole.events[i].peak_mm);
        }
    }
}

TEST_CASE("no event has a dry spell in it or too little rain, and its figures are its rain's") {
    const std::vector<std::int64_t> seconds = year_of_tips(11);
    std::vector<double> minutes;
    for (const std::int64_t s : seconds)
        minutes.push_back(static_cast<double>(s - seconds.front()) / 60.0);
    const GaugeRecord record = log_at(minutes);
    const TipLog& log = tips_of(record);
    const bool spread = GENERATE(false, true);
    const EventSteps steps{5.0 / 60.0, spread};
    for (const EventRule rule : {EventRule{6.0, 0.0}, EventRule{3.0, 1.0}, EventRule{24.0, 5.0}}) {
        const RecordEvents found = find_events(record, rule, steps);
        REQUIRE_FALSE(found.events.empty());
        for (const RainEvent& event : found.events) {
            for (std::size_t i = event.first; i + 1 < event.end; ++i) {
                double held_mm = 0.0;
                std::size_t k = i + 1;
                const auto hours = [&] {
                    return static_cast<double>(log.unix_ms[k] - log.unix_ms[i]) / kHour_ms;
                };
                for (; k < event.end && hours() < rule.dry_spell_h - 1e-9; ++k)
                    held_mm += log.depth(k);
                if (k < event.end) REQUIRE(held_mm >= rule.threshold_mm - 1e-9);
            }
            REQUIRE(event.depth_mm >= rule.threshold_mm - 1e-9);
            const Hyetograph rain = event_rain(record, event, rule, steps);
            REQUIRE_THAT(total_depth_mm(rain), WithinRel(event.depth_mm, 1e-12));
            REQUIRE(rain.steps() == steps_of(record, event, steps));
            REQUIRE(rain.stamps->unix_ms.front() == event.from_ms);
            REQUIRE(rain.stamps->unix_ms.back() == event.to_ms);
        }
    }
}

}  // namespace rainledger
