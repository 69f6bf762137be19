#include "rain/rain_before.hpp"

#include <algorithm>
#include <cstddef>
#include <variant>

#include "rain/rain_elements.hpp"

namespace rainledger {
namespace {

std::vector<double> running_sum(const std::vector<double>& depth_mm) {
    std::vector<double> sum_mm{0.0};
    if (depth_mm.empty()) return sum_mm;
    sum_mm.reserve(depth_mm.size() + 1);
    for (const double depth : depth_mm)
        sum_mm.push_back(sum_mm.back() + depth);
    return sum_mm;
}

}  // namespace

RainBefore::RainBefore(const GaugeRecord& record)
    : record_(record),
      sum_mm_(
          std::visit([](const auto& rain) { return running_sum(rain.depth_mm); }, record.rain)) {}

double RainBefore::up_to_mm(std::int64_t ms) const {
    return std::visit([&](const auto& rain) { return up_to_mm(rain, ms); }, record_.rain);
}

double RainBefore::up_to_mm(const TipLog& log, std::int64_t ms) const {
    const auto behind = std::ranges::upper_bound(log.unix_ms, ms);
    const auto tips = static_cast<std::size_t>(behind - log.unix_ms.begin());
    return log.depth_mm.empty() ? static_cast<double>(tips) * log.tip_mm : sum_mm_[tips];
}

double RainBefore::up_to_mm(const Hyetograph& rain, std::int64_t ms) const {
    const std::size_t behind = edge_behind(rain, ms);
    if (behind == 0) return 0.0;
    const std::size_t step = behind - 1;
    if (step == rain.own_steps) return sum_mm_[step];
    const auto from_ms = static_cast<double>(edge_ms(rain, step));
    const auto to_ms = static_cast<double>(edge_ms(rain, step + 1));
    const double share = (static_cast<double>(ms) - from_ms) / (to_ms - from_ms);
    return sum_mm_[step] + share * rain.depth_mm[step];
}

}  // namespace rainledger
