#include "rain/tip_steps.hpp"

#include <algorithm>
#include <cmath>

#include "rain/rain_elements.hpp"

namespace rainledger {
namespace {

constexpr std::int64_t kMsPerMinute = 60'000;
constexpr std::int64_t kMsPerDay = 86'400'000;

std::int64_t floor_divide(std::int64_t a, std::int64_t b) {
    return a / b - (a % b < 0 ? 1 : 0);
}

/// Gathers steps from the first onward.
class StepMaker {
public:
    explicit StepMaker(SteppedTips& stepped) : stepped_(stepped) {}

    void add(std::int64_t step, double depth_mm);
    void add_alike(std::int64_t step, std::int64_t count, double depth_mm);
    void spread(double begin_ms, double end_ms, double depth_mm);

private:
    void begin_at(std::int64_t step);

    SteppedTips& stepped_;
};

/// Brings the end to `step`, by dry steps where there is a gap.
void StepMaker::begin_at(std::int64_t step) {
    if (stepped_.runs.empty())
        stepped_.first = step;
    else if (step > stepped_.end)
        stepped_.runs.push_back({step - stepped_.end, 0.0});
    stepped_.end = step;
}

/// Adds rain to one step, the last one so far or a later one.
void StepMaker::add(std::int64_t step, double depth_mm) {
    if (!stepped_.runs.empty() && step + 1 == stepped_.end) {
        stepped_.runs.back().depth_mm += depth_mm;
        return;
    }
    add_alike(step, 1, depth_mm);
}

void StepMaker::add_alike(std::int64_t step, std::int64_t count, double depth_mm) {
    if (count == 0) return;
    begin_at(step);
    stepped_.runs.push_back({count, depth_mm});
    stepped_.end += count;
}

/// Adds rain that falls evenly between two instants. The step that holds its end is one of its own,
/// so that later rain can be added to it.
void StepMaker::spread(double begin_ms, double end_ms, double depth_mm) {
    const StepGrid& grid = stepped_.grid;
    const double length_ms = end_ms - begin_ms;
    const std::int64_t first = grid.step_from(static_cast<std::int64_t>(std::floor(begin_ms)));
    const std::int64_t last = grid.step_to(static_cast<std::int64_t>(std::ceil(end_ms)));
    if (first == last) {
        add(first, depth_mm);
        return;
    }
    const auto part_mm = [&](double from_ms, double to_ms) {
        return depth_mm * (to_ms - from_ms) / length_ms;
    };
    const auto every_ms = static_cast<double>(grid.every_ms);
    add(first, part_mm(begin_ms, static_cast<double>(grid.edge_ms(first + 1))));
    add_alike(first + 1, last - first - 1, depth_mm * every_ms / length_ms);
    add(last, part_mm(static_cast<double>(grid.edge_ms(last)), end_ms));
}

/// One past the last tip at the instant of tip `i`.
std::size_t end_of_instant(const TipLog& log, std::size_t i, std::size_t end) {
    const std::int64_t ms = log.unix_ms[i];
    while (i < end && log.unix_ms[i] == ms)
        ++i;
    return i;
}

/// How long the first tip of a range takes: as long as the second, or a step.
double first_length_ms(const TipLog& log, const TipRange& range, std::int64_t every_ms) {
    const std::size_t second = end_of_instant(log, range.first, range.end);
    if (second == range.end) return static_cast<double>(every_ms);
    return static_cast<double>(log.unix_ms[second] - log.unix_ms[range.first]);
}

void spread_tips(const TipLog& log, const TipRange& range, double longest_ms, StepMaker& maker,
                 std::int64_t every_ms) {
    double length_ms = first_length_ms(log, range, every_ms);
    if (range.from_ms)
        length_ms =
            std::min(length_ms, static_cast<double>(log.unix_ms[range.first] - *range.from_ms));
    for (std::size_t i = range.first; i < range.end;) {
        const std::size_t next = end_of_instant(log, i, range.end);
        double depth_mm = 0.0;
        for (std::size_t k = i; k < next; ++k)
            depth_mm += log.depth(k);
        const auto end_ms = static_cast<double>(log.unix_ms[i]);
        maker.spread(end_ms - std::min(length_ms, longest_ms), end_ms, depth_mm);
        if (next < range.end) length_ms = static_cast<double>(log.unix_ms[next] - log.unix_ms[i]);
        i = next;
    }
}

}  // namespace

std::int64_t StepGrid::step_from(std::int64_t ms) const {
    return floor_divide(ms - origin_ms, every_ms);
}

StepGrid grid_at(const TipLog& log, std::size_t first, const EventSteps& steps) {
    const std::int64_t offset_ms =
        log.has_offset ? log.offset_minutes[first] * kMsPerMinute : std::int64_t{0};
    const std::int64_t face_ms = log.unix_ms[first] + offset_ms;
    StepGrid grid;
    grid.origin_ms = floor_divide(face_ms - 1, kMsPerDay) * kMsPerDay - offset_ms;
    grid.every_ms = std::max<std::int64_t>(1, std::llround(steps.every_h * kMsPerHour));
    return grid;
}

SteppedTips step_tips(const TipLog& log, const TipRange& range, const StepGrid& grid,
                      const EventRule& rule, bool spread) {
    SteppedTips stepped;
    stepped.grid = grid;
    StepMaker maker(stepped);
    if (spread)
        spread_tips(log, range, rule.dry_spell_h * kMsPerHour, maker, grid.every_ms);
    else
        for (std::size_t i = range.first; i < range.end; ++i)
            maker.add(grid.step_to(log.unix_ms[i]), log.depth(i));
    return stepped;
}

void widen(SteppedTips& stepped, std::int64_t first, std::int64_t end) {
    if (stepped.runs.empty()) stepped.first = stepped.end = first;
    if (first < stepped.first) {
        stepped.runs.push_back({stepped.first - first, 0.0});
        std::rotate(stepped.runs.begin(), stepped.runs.end() - 1, stepped.runs.end());
        stepped.first = first;
    }
    if (end > stepped.end) {
        stepped.runs.push_back({end - stepped.end, 0.0});
        stepped.end = end;
    }
}

}  // namespace rainledger
