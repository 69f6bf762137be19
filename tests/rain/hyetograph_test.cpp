#include "rainledger/rain/hyetograph.hpp"

#include <array>
#include <numeric>

#include "test.hpp"

namespace rainledger {
namespace {

using Numbers = std::vector<double>;

StampedEdges five_minutes_apart(std::size_t edges) {
    StampedEdges stamps;
    stamps.has_offset = true;
    for (std::size_t i = 0; i < edges; ++i)
        stamps.unix_ms.push_back(1'772'611'500'000 + static_cast<std::int64_t>(i) * 300'000);
    stamps.offset_minutes.assign(edges, 60);
    return stamps;
}

}  // namespace

TEST_CASE("a hyetograph keeps its edges as given, and hours beside them") {
    const Hyetograph rain = make_hyetograph({5, 10, 15, 60}, "min", {0.4, 1.2, 3.0});
    CHECK(rain.steps() == 3);
    CHECK(rain.own_steps == 3);
    CHECK(rain.given->value == Numbers{5, 10, 15, 60});
    CHECK(rain.given->unit == "min");
    CHECK_FALSE(rain.stamps);
    CHECK(rain.edges_h == Numbers{5.0 / 60, 10.0 / 60, 15.0 / 60, 1.0});
    CHECK(rain.duration_h == Numbers{5.0 / 60, 5.0 / 60, 0.75});
    CHECK(rain.intensity_mm_per_h(2) == 4.0);
    CHECK(own_duration_h(rain) == 55.0 / 60);
    CHECK_THAT(total_depth_mm(rain), WithinRel(4.6, 1e-15));
    CHECK_THAT(peak_intensity_mm_per_h(rain), WithinRel(14.4, 1e-15));
}

TEST_CASE("equal steps have equal durations to the last bit") {
    Numbers edges(1001);
    std::iota(edges.begin(), edges.end(), 0.0);
    const Hyetograph rain = make_hyetograph(edges, "min", Numbers(1000, 0.1));
    CHECK(rain.duration_h == Numbers(1000, 1.0 / 60));
}

TEST_CASE("stamped edges count hours from the first") {
    const Hyetograph rain = make_hyetograph(five_minutes_apart(3), {1.0, 2.0});
    CHECK(rain.edges_h == Numbers{0.0, 5.0 / 60, 10.0 / 60});
    CHECK(rain.duration_h == Numbers{5.0 / 60, 5.0 / 60});
    CHECK(own_duration_h(rain) == 10.0 / 60);
    CHECK_FALSE(rain.given);
    CHECK_FALSE(rain.clock_assumed);
    StampedEdges face_only = five_minutes_apart(2);
    face_only.has_offset = false;
    CHECK(make_hyetograph(face_only, {1.0}).clock_assumed);
}

TEST_CASE("an allowance scales every depth") {
    Hyetograph rain = make_hyetograph({0, 1, 2}, "h", {1.0, 2.5});
    multiply_depths(rain, 1.2);
    CHECK(rain.depth_mm == Numbers{1.2, 3.0});
}

TEST_CASE("dry time is appended in steps of the last one's length") {
    Hyetograph rain = make_hyetograph({0, 10, 15}, "min", {1.0, 2.0});

    SECTION("a shorter step closes it") {
        append_dry_time(rain, 12.0 / 60);
        CHECK(rain.given->value == Numbers{0, 10, 15, 20, 25, 27});
    }
    SECTION("a remainder below 1e-9 h is no step") {
        append_dry_time(rain, 10.0 / 60 + 0.5e-9);
        CHECK(rain.given->value == Numbers{0, 10, 15, 20, 25});
        append_dry_time(rain, 5.0 / 60 - 0.5e-9);
        CHECK(rain.given->value == Numbers{0, 10, 15, 20, 25, 30});
    }
    SECTION("less than one step") {
        append_dry_time(rain, 2.0 / 60);
        CHECK(rain.given->value == Numbers{0, 10, 15, 17});
    }
    SECTION("next to nothing is nothing") {
        append_dry_time(rain, 0.5e-9);
        CHECK(rain.steps() == 2);
    }

    CHECK(rain.own_steps == 2);
    CHECK(rain.edges_h.size() == rain.given->value.size());
    CHECK(rain.duration_h.size() == rain.steps());
    CHECK(rain.edges_h.back() == rain.given->value.back() / 60);
    CHECK(total_depth_mm(rain) == 3.0);
    CHECK(own_duration_h(rain) == 0.25);
    for (std::size_t step = 2; step < rain.steps(); ++step)
        CHECK(rain.depth_mm[step] == 0.0);
}

TEST_CASE("dry time goes on in stamps, and in bare hours") {
    Hyetograph stamped = make_hyetograph(five_minutes_apart(2), {1.0});
    append_dry_time(stamped, 0.125);
    const std::int64_t first = stamped.stamps->unix_ms.front();
    CHECK(stamped.stamps->unix_ms ==
          std::vector<std::int64_t>{first, first + 300'000, first + 600'000, first + 750'000});
    CHECK(stamped.stamps->offset_minutes == std::vector<std::int16_t>{60, 60, 60, 60});
    CHECK(stamped.edges_h == Numbers{0.0, 5.0 / 60, 10.0 / 60, 12.5 / 60});

    Hyetograph bare = cut_hyetograph(make_hyetograph({0, 1}, "h", {1.0}), {}).rain;
    append_dry_time(bare, 1.5);
    CHECK(bare.edges_h == Numbers{0, 1, 2, 2.5});
    CHECK(bare.duration_h == Numbers{1, 1, 0.5});
    CHECK(bare.depth_mm == Numbers{1, 0, 0});
}

TEST_CASE("stamps are written in ISO 8601 with their offset where known") {
    StampedEdges stamps;
    stamps.unix_ms = {0, 1'772'615'100'000, 1'772'615'100'250, -1};
    stamps.offset_minutes = {0, 60, -210, 0};
    stamps.has_offset = true;
    CHECK(iso_stamp(stamps, 0) == "1970-01-01T00:00:00Z");
    CHECK(iso_stamp(stamps, 1) == "2026-03-04T10:05:00+01:00");
    CHECK(iso_stamp(stamps, 2) == "2026-03-04T05:35:00.250-03:30");
    CHECK(iso_stamp(stamps, 3) == "1969-12-31T23:59:59.999Z");
    stamps.has_offset = false;
    CHECK(iso_stamp(stamps, 1) == "2026-03-04T09:05:00");
}

TEST_CASE("cuts make new steps of the same intensity that add up to the old ones") {
    Hyetograph rain = make_hyetograph({0, 1, 3}, "h", {0.7, 2.2});
    append_dry_time(rain, 2.0);
    const std::array cuts{-1.0, 0.0, 0.3, 0.3 + 0.5e-9, 0.7, 1.0 - 0.5e-9, 1.0, 2.5, 4.0, 9.0};
    const CutHyetograph cut = cut_hyetograph(rain, cuts);
    CHECK(cut.rain.edges_h == Numbers{0, 0.3, 0.7, 1, 2.5, 3, 4, 5});
    CHECK(cut.step_of == std::vector<std::size_t>{0, 0, 0, 1, 1, 2, 2});
    CHECK(cut.rain.own_steps == 5);
    CHECK_THAT(total_depth_mm(cut.rain), WithinRel(2.9, 1e-15));
    for (std::size_t i = 0; i < cut.rain.steps(); ++i) {
        CHECK_THAT(cut.rain.duration_h[i],
                   WithinRel(cut.rain.edges_h[i + 1] - cut.rain.edges_h[i], 1e-14));
        CHECK_THAT(cut.rain.intensity_mm_per_h(i),
                   WithinAbs(rain.intensity_mm_per_h(cut.step_of[i]), 1e-14));
    }
}

TEST_CASE("a hyetograph without cuts stays as it is to the last bit") {
    const Hyetograph rain = make_hyetograph({5, 10, 12, 60}, "min", {0.4, 1.2, 3.0});
    const std::array edges{10.0 / 60, 12.0 / 60};
    for (const CutHyetograph& cut : {cut_hyetograph(rain, {}), cut_hyetograph(rain, edges)}) {
        CHECK(cut.rain.edges_h == rain.edges_h);
        CHECK(cut.rain.duration_h == rain.duration_h);
        CHECK(cut.rain.depth_mm == rain.depth_mm);
        CHECK(cut.step_of == std::vector<std::size_t>{0, 1, 2});
    }
}

}  // namespace rainledger
