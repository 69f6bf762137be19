#include <cmath>
#include <cstddef>
#include <vector>

#include "rain/synthetic_logger.hpp"
#include "rainledger/rain/rain_events.hpp"
#include "test.hpp"

namespace rainledger {
namespace {

using Values = std::vector<double>;

}  // namespace

TEST_CASE("resampling finds the rain at the new edges") {
    const Hyetograph rain = make_hyetograph({0.0, 5.0, 10.0, 20.0}, "min", {1.0, 3.0, 2.0});
    SECTION("coarser, with a last step beyond the rain") {
        const ResampledRain coarse = resample(rain, 7.5 / 60.0);
        CHECK(coarse.rain.given->value == Values{0.0, 7.5, 15.0, 22.5});
        CHECK_THAT(coarse.rain.depth_mm[0], WithinAbs(2.5, 1e-12));
        CHECK_THAT(coarse.rain.depth_mm[1], WithinAbs(2.5, 1e-12));
        CHECK_THAT(coarse.rain.depth_mm[2], WithinAbs(1.0, 1e-12));
        CHECK_THAT(coarse.peak_before_mm_per_h, WithinAbs(36.0, 1e-9));
        CHECK_THAT(coarse.peak_after_mm_per_h, WithinAbs(20.0, 1e-9));
        CHECK(coarse.rain.own_steps == 3);
    }
    SECTION("finer keeps the peak") {
        const ResampledRain fine = resample(rain, 1.0 / 60.0);
        CHECK(fine.rain.steps() == 20);
        CHECK_THAT(fine.peak_after_mm_per_h, WithinRel(36.0, 1e-9));
    }
    SECTION("at its own step, to the last bit") {
        const Hyetograph even = make_hyetograph({0.0, 5.0, 10.0, 15.0}, "min", {0.1, 0.7, 0.3});
        const ResampledRain same = resample(even, 5.0 / 60.0);
        CHECK(same.rain.depth_mm == even.depth_mm);
        CHECK(same.rain.duration_h == even.duration_h);
        CHECK(same.peak_after_mm_per_h == same.peak_before_mm_per_h);
    }
    SECTION("one step for all") {
        const ResampledRain one = resample(rain, 2.0);
        CHECK(one.rain.depth_mm == Values{6.0});
    }
}

TEST_CASE("resampling keeps stamps and offsets, in whole milliseconds") {
    StampedEdges edges;
    edges.unix_ms = {1'939'161'600'000, 1'939'161'600'000 + 600'000, 1'939'161'600'000 + 1'200'000};
    edges.offset_minutes = {120, 60, 60};
    edges.has_offset = true;
    Hyetograph rain = make_hyetograph(edges, {1.0, 2.0});
    rain.clock_assumed = true;
    const ResampledRain thirds = resample(rain, 1.0 / 7.0);
    REQUIRE(thirds.rain.stamps.has_value());
    CHECK(thirds.rain.stamps->unix_ms[1] - edges.unix_ms[0] == 514'286);
    CHECK(thirds.rain.stamps->unix_ms[2] - edges.unix_ms[0] == 1'028'571);
    CHECK(thirds.rain.stamps->offset_minutes == std::vector<std::int16_t>{120, 120, 60, 60});
    CHECK(thirds.rain.stamps->has_offset);
    CHECK(thirds.rain.clock_assumed);
    CHECK_THAT(total_depth_mm(thirds.rain), WithinAbs(3.0, 1e-12));
}

TEST_CASE("resampling keeps what was taken as dry") {
    Hyetograph rain = make_hyetograph({0.0, 5.0, 10.0, 15.0, 20.0}, "min", {1.0, 0.0, 0.0, 2.0});
    rain.dry_steps = {1, 2};
    rain.taken_as_dry_h = 10.0 / 60.0;
    const ResampledRain coarse = resample(rain, 10.0 / 60.0);
    CHECK(coarse.rain.dry_steps.empty());
    CHECK(coarse.rain.taken_as_dry_h == rain.taken_as_dry_h);
    CHECK(resample(rain, 2.5 / 60.0).rain.dry_steps == std::vector<std::size_t>{2, 3, 4, 5});
}

TEST_CASE("edges at another step are whole to the last bit") {
    std::vector<double> minutes;
    for (int edge = 0; edge <= 1440; ++edge)
        minutes.push_back(edge);
    const Hyetograph rain = make_hyetograph(minutes, "min", Values(1440, 0.1));
    const int every_min = GENERATE(1, 3, 7, 15);
    const Hyetograph other = resample(rain, every_min / 60.0).rain;
    for (std::size_t edge = 0; edge <= other.steps(); ++edge)
        REQUIRE(other.given->value[edge] == static_cast<double>(edge) * every_min);
}

TEST_CASE("resampling leaves out what continues a storm") {
    Hyetograph rain = make_hyetograph({0.0, 5.0, 10.0}, "min", {1.0, 3.0});
    append_dry_time(rain, 1.0);
    CHECK(resample(rain, 10.0 / 60.0).rain.depth_mm == Values{4.0});
}

TEST_CASE("resampling keeps all rain at any step, and never raises the peak") {
    SeededNumbers numbers(17);
    for (int round = 0; round < 500; ++round) {
        std::vector<double> edges{numbers.between(-50.0, 50.0)};
        std::vector<double> depth_mm;
        const std::size_t count = 1 + numbers.below(40);
        for (std::size_t i = 0; i < count; ++i) {
            edges.push_back(edges.back() + numbers.between(0.5, 30.0));
            depth_mm.push_back(numbers.share() < 0.3 ? 0.0 : numbers.between(0.0, 9.0));
        }
        const Hyetograph rain = make_hyetograph(edges, "min", depth_mm);
        const ResampledRain other = resample(rain, numbers.between(0.1, 90.0) / 60.0);
        CAPTURE(round);
        REQUIRE_THAT(total_depth_mm(other.rain), WithinAbs(total_depth_mm(rain), 1e-11));
        REQUIRE(other.peak_after_mm_per_h <= other.peak_before_mm_per_h * (1.0 + 1e-9));
        REQUIRE(other.rain.edges_h.front() == rain.edges_h.front());
        REQUIRE(other.rain.edges_h.back() >= rain.edges_h.back() - 1e-9);
        for (const double depth : other.rain.depth_mm)
            REQUIRE(depth >= 0.0);
    }
}

}  // namespace rainledger
