#include "rainledger/fieldtest/readings.hpp"

#include <algorithm>
#include <array>
#include <cmath>
#include <numbers>
#include <utility>

#include "rainledger/base/cut.hpp"
#include "rainledger/base/number.hpp"

namespace rainledger {
namespace {

constexpr double kMmPerM = 1000.0;
constexpr double kMinutesPerHour = 60.0;

double circle_m2(double diameter_mm) {
    const double diameter_m = diameter_mm / kMmPerM;
    return std::numbers::pi / 4.0 * diameter_m * diameter_m;
}

std::string minutes(double time_h) {
    return fixed(time_h * kMinutesPerHour, 2) + " min";
}

std::string millimetres(double depth_mm) {
    return shortest(depth_mm) + " mm";
}

/// Reduces the rows of one pit.
class PitReducer {
public:
    PitReducer(ReadingKind kind, double area_m2, std::vector<ReadingProblem>& problems)
        : kind_(kind), area_m2_(area_m2), problems_(problems) {}

    void add(std::size_t index, const ReadingRow& row);
    [[nodiscard]] InfiltrationTest finish(const std::string& pit);

private:
    [[nodiscard]] bool is_sound(std::size_t index, const ReadingRow& row);
    [[nodiscard]] bool in_order(std::size_t index, const ReadingRow& row);
    void take_start(std::size_t index, const ReadingRow& row);
    void take_refill(std::size_t index, const ReadingRow& row);
    void take_reading(std::size_t index, const ReadingRow& row);
    [[nodiscard]] double interval_mm(std::size_t index, const ReadingRow& row);
    void report_fall(std::size_t index, const ReadingRow& row);
    void problem(std::size_t index, ReadingCell cell, std::string message, std::string hint) {
        problems_.push_back({index, cell, std::move(message), std::move(hint)});
    }

    ReadingKind kind_;
    double area_m2_;
    std::vector<ReadingProblem>& problems_;
    std::vector<TestReading> readings_;
    std::size_t first_ = 0;
    bool any_ = false;
    bool refilled_ = false;  // the row before was a refill
    double time_h_ = 0.0;    // of the row before
    double value_ = 0.0;     // of the row before, for cumulative kinds
};

bool PitReducer::is_sound(std::size_t index, const ReadingRow& row) {
    if (!(row.time_h >= 0.0 && std::isfinite(row.time_h))) {
        problem(index, ReadingCell::time, "the time is negative or not finite",
                "times count from the start of the test");
        return false;
    }
    if (!std::isfinite(row.value)) {
        problem(index, ReadingCell::value, "the reading is not a finite number", {});
        return false;
    }
    if (!row.refill || kind_ == ReadingKind::water_level) return true;
    problem(index, ReadingCell::refill, "a refill is marked beside readings of another kind",
            "refills belong to water levels");
    return false;
}

bool PitReducer::in_order(std::size_t index, const ReadingRow& row) {
    if (row.time_h > time_h_) return true;
    if (row.time_h == time_h_)
        problem(index, ReadingCell::time, "the time " + minutes(row.time_h) + " stands twice",
                kind_ == ReadingKind::water_level
                    ? "mark the second row as a refill if it is the level after filling up"
                    : "give each time one row");
    else
        problem(index, ReadingCell::time,
                "the time " + minutes(row.time_h) + " comes before that of the row above, " +
                    minutes(time_h_),
                "put the rows in order of time");
    return false;
}

void PitReducer::take_start(std::size_t index, const ReadingRow& row) {
    const bool is_level = kind_ == ReadingKind::water_level;
    if (row.refill) {
        problem(index, ReadingCell::refill, "the first row is marked as a refill",
                "begin with the level at time 0, unmarked");
    } else if (is_level && row.time_h > 0.0) {
        problem(index, ReadingCell::time, "the first level is of " + minutes(row.time_h),
                "begin with the level at time 0");
    } else if (!is_level && row.time_h == 0.0 && row.value != 0.0) {
        problem(index, ReadingCell::value, "something has infiltrated at time 0",
                "a row at time 0 holds 0");
    } else if (!is_level && row.time_h > 0.0) {
        take_reading(index, row);
        return;
    }
    time_h_ = row.time_h;
    value_ = row.value;
}

void PitReducer::take_refill(std::size_t index, const ReadingRow& row) {
    if (refilled_) {
        problem(index, ReadingCell::refill, "a refill follows a refill",
                "give a level between the two");
    } else if (row.time_h != time_h_) {
        problem(index, ReadingCell::time, "a refill without the level just before it",
                "give two rows of the same time: the level before filling, then the marked one "
                "after");
    } else if (!(row.value > value_)) {
        problem(index, ReadingCell::value,
                "the refill to " + millimetres(row.value) + " does not raise the level of " +
                    millimetres(value_),
                "the marked row holds the level after filling up");
    }
    refilled_ = true;
    time_h_ = std::max(time_h_, row.time_h);
    value_ = row.value;
}

void PitReducer::report_fall(std::size_t index, const ReadingRow& row) {
    const std::string to = millimetres(row.value);
    switch (kind_) {
        case ReadingKind::infiltrated:
            problem(index, ReadingCell::value,
                    "the infiltrated depth falls from " + millimetres(value_) + " to " + to,
                    "give depths since the start of the test, or call the column drop");
            return;
        case ReadingKind::drop:
            problem(index, ReadingCell::value, "a drop of " + to + " is negative",
                    "a drop is how far the water fell since the reading before");
            return;
        case ReadingKind::volume_added:
            problem(index, ReadingCell::value, "a volume added is negative", {});
            return;
        case ReadingKind::water_level:
            problem(index, ReadingCell::value,
                    "the water rises from " + millimetres(value_) + " to " + to,
                    "mark a refill; a level is a height, so that it falls as water infiltrates");
            return;
    }
}

double PitReducer::interval_mm(std::size_t index, const ReadingRow& row) {
    double depth = row.value;
    if (kind_ == ReadingKind::infiltrated) depth = row.value - value_;
    if (kind_ == ReadingKind::water_level) depth = value_ - row.value;
    if (kind_ == ReadingKind::volume_added) depth = row.value / area_m2_ * kMmPerM;
    if (depth < 0.0) report_fall(index, row);
    return depth;
}

void PitReducer::take_reading(std::size_t index, const ReadingRow& row) {
    TestReading reading;
    reading.row = index;
    reading.start_h = time_h_;
    reading.end_h = row.time_h;
    reading.middle_h = 0.5 * (time_h_ + row.time_h);
    reading.interval_mm = interval_mm(index, row);
    const double before = readings_.empty() ? 0.0 : readings_.back().depth_mm;
    reading.depth_mm = kind_ == ReadingKind::infiltrated ? row.value : before + reading.interval_mm;
    reading.rate_mm_per_h = reading.interval_mm / (reading.end_h - reading.start_h);
    readings_.push_back(reading);
    refilled_ = false;
    time_h_ = row.time_h;
    value_ = row.value;
}

void PitReducer::add(std::size_t index, const ReadingRow& row) {
    if (!is_sound(index, row)) return;
    if (!any_) {
        any_ = true;
        first_ = index;
        take_start(index, row);
    } else if (row.refill) {
        take_refill(index, row);
    } else if (in_order(index, row)) {
        take_reading(index, row);
    }
}

InfiltrationTest PitReducer::finish(const std::string& pit) {
    if (any_ && readings_.empty())
        problem(first_, ReadingCell::time, "the test has no reading after its start",
                "give the readings that follow");
    return {pit, kind_, 0.0, std::move(readings_)};
}

std::vector<std::string> pits_of(std::span<const ReadingRow> rows) {
    std::vector<std::string> pits;
    for (const ReadingRow& row : rows)
        if (std::ranges::find(pits, row.pit) == pits.end()) pits.push_back(row.pit);
    return pits;
}

}  // namespace

std::string_view reading_kind_name(ReadingKind kind) {
    constexpr std::array<std::string_view, 4> kNames{"infiltrated", "drop", "volume_added",
                                                     "water_level"};
    return kNames[static_cast<std::size_t>(kind)];
}

double inner_area_m2(const Rings& rings) {
    return circle_m2(rings.inner_diameter_mm);
}

double annulus_area_m2(const Rings& rings) {
    if (!rings.outer_diameter_mm) return 0.0;
    return circle_m2(*rings.outer_diameter_mm) - circle_m2(rings.inner_diameter_mm);
}

std::string rings_problem(const Rings& rings) {
    if (!(rings.inner_diameter_mm > 0.0 && std::isfinite(rings.inner_diameter_mm)))
        return "the inner ring has no diameter";
    if (rings.outer_diameter_mm && !(*rings.outer_diameter_mm > rings.inner_diameter_mm &&
                                     std::isfinite(*rings.outer_diameter_mm)))
        return "the outer ring is no wider than the inner one";
    return {};
}

ReducedReadings reduce_readings(std::span<const ReadingRow> rows, ReadingKind kind,
                                const std::optional<Rings>& rings) {
    ReducedReadings reduced;
    std::string trouble = rings ? rings_problem(*rings) : std::string{};
    if (kind == ReadingKind::volume_added && !rings)
        trouble = "volumes need the inner ring's diameter to become depths";
    if (!trouble.empty()) {
        reduced.problems.push_back({0, ReadingCell::value, std::move(trouble), {}});
        return reduced;
    }
    const double area_m2 = rings ? inner_area_m2(*rings) : 1.0;
    for (const std::string& pit : pits_of(rows)) {
        PitReducer reducer(kind, area_m2, reduced.problems);
        for (std::size_t i = 0; i < rows.size(); ++i)
            if (rows[i].pit == pit) reducer.add(i, rows[i]);
        reduced.tests.push_back(reducer.finish(pit));
    }
    if (reduced.problems.empty()) return reduced;
    std::ranges::stable_sort(reduced.problems, {}, &ReadingProblem::row);
    reduced.tests.clear();
    return reduced;
}

InfiltrationTest without_first(const InfiltrationTest& test, double ignored_h) {
    InfiltrationTest rest{test.pit, test.kind, test.from_h, {}};
    double before_mm = 0.0;
    for (const TestReading& reading : test.readings) {
        if (reading.start_h < ignored_h) {
            rest.from_h = reading.end_h;
            before_mm = reading.depth_mm;
            continue;
        }
        rest.readings.push_back(reading);
        rest.readings.back().depth_mm -= before_mm;
    }
    return rest;
}

}  // namespace rainledger
