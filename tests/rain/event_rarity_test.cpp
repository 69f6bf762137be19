#include <cmath>
#include <vector>

#include "rainledger/rain/rain_events.hpp"
#include "test.hpp"

namespace rainledger {
namespace {

/// Invented depths for 2, 10 and 100 years.
RainfallStatistics county() {
    RainfallStatistics statistics;
    statistics.duration_h = {5.0 / 60.0, 0.25, 1.0, 24.0};
    statistics.return_period_yr = {2.0, 10.0, 100.0};
    statistics.depth_mm = {8.0, 12.0, 18.0, 15.0, 23.0, 35.0, 27.0, 41.0, 61.0, 58.0, 88.0, 131.0};
    return statistics;
}

}  // namespace

TEST_CASE("an event's rarity by duration, and the duration at which it was rarest") {
    // 12 mm in the middle five minutes of fifteen.
    const Hyetograph rain = make_hyetograph({0.0, 5.0, 10.0, 15.0}, "min", {2.0, 12.0, 1.0});
    const EventRarity found = rarity_of(rain, county());
    REQUIRE(found.by_duration.size() == 2);
    CHECK(found.by_duration[0].duration_h == 5.0 / 60.0);
    CHECK_THAT(found.by_duration[0].depth_mm, WithinAbs(12.0, 1e-12));
    REQUIRE(found.by_duration[0].rarity.years.has_value());
    CHECK_THAT(*found.by_duration[0].rarity.years, WithinAbs(10.0, 1e-9));
    CHECK_THAT(found.by_duration[1].depth_mm, WithinAbs(15.0, 1e-12));
    REQUIRE(found.by_duration[1].rarity.years.has_value());
    CHECK_THAT(*found.by_duration[1].rarity.years, WithinAbs(2.0, 1e-9));
    CHECK(found.rarest == 0);
}

TEST_CASE("an event shorter than every duration is judged by the shortest") {
    const Hyetograph rain = make_hyetograph({0.0, 2.0}, "min", {9.0});
    const EventRarity found = rarity_of(rain, county());
    REQUIRE(found.by_duration.size() == 1);
    CHECK(found.by_duration[0].depth_mm == 9.0);
}

TEST_CASE("beyond the table an event is rarer than any within, below it than none") {
    SECTION("of two beyond the table the shorter") {
        const Hyetograph rain = make_hyetograph({0.0, 5.0, 10.0, 15.0}, "min", {0.0, 40.0, 0.0});
        const EventRarity found = rarity_of(rain, county());
        REQUIRE(found.by_duration.size() == 2);
        CHECK(found.by_duration[0].rarity.more_than == 100.0);
        CHECK(found.by_duration[1].rarity.more_than == 100.0);
        CHECK(found.rarest == 0);
    }
    SECTION("beyond rather than just at the last column") {
        const Hyetograph rain = make_hyetograph({0.0, 5.0, 10.0, 15.0}, "min", {9.0, 18.0, 9.0});
        const EventRarity found = rarity_of(rain, county());
        CHECK_THAT(found.by_duration[0].rarity.years.value_or(0.0), WithinRel(100.0, 1e-9));
        CHECK(found.by_duration[1].rarity.more_than == 100.0);
        CHECK(found.rarest == 1);
    }
    SECTION("below the first column") {
        const Hyetograph rain = make_hyetograph({0.0, 5.0, 10.0, 15.0}, "min", {1.0, 1.0, 1.0});
        const EventRarity found = rarity_of(rain, county());
        CHECK(found.by_duration[0].rarity.less_than == 2.0);
        CHECK(found.rarest == 0);
    }
}

}  // namespace rainledger
