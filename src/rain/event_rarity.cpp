#include <algorithm>
#include <utility>

#include "rainledger/rain/rain_events.hpp"
#include "rainledger/rain/rain_windows.hpp"

namespace rainledger {
namespace {

constexpr double kSameLength_h = 1e-9;

/// How rare, for comparison: the return period, and whether it is known to be longer.
std::pair<double, bool> how_rare(const Rarity& rarity) {
    if (rarity.years) return {*rarity.years, false};
    if (rarity.more_than) return {*rarity.more_than, true};
    return {0.0, false};
}

}  // namespace

EventRarity rarity_of(const Hyetograph& rain, const RainfallStatistics& statistics) {
    EventRarity found;
    const CumulativeDepth cumulative(rain);
    const double longest_h = own_duration_h(rain) + kSameLength_h;
    for (const double duration_h : statistics.duration_h) {
        if (!found.by_duration.empty() && duration_h > longest_h) break;
        const double depth_mm = cumulative.largest_depth_mm(duration_h);
        const auto rarity = rarity_of(statistics, duration_h, depth_mm);
        found.by_duration.push_back({duration_h, depth_mm, rarity.value_or(Rarity{})});
    }
    // Of equals the first, which is the shortest.
    const auto rarest = std::ranges::max_element(
        found.by_duration, {}, [](const DurationRarity& one) { return how_rare(one.rarity); });
    found.rarest = static_cast<std::size_t>(rarest - found.by_duration.begin());
    return found;
}

}  // namespace rainledger
