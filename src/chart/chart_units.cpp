#include "chart/chart_units.hpp"

#include "rainledger/base/number.hpp"
#include "rainledger/base/quantity.hpp"

namespace rainledger {

ChartUnits::ChartUnits(DisplayUnits units)
    : metric_(units == DisplayUnits::metric),
      mm_per_unit_(find_unit(metric_ ? "mm" : "in", Dimension::depth)->to_canonical(1.0)) {}

std::string ChartUnits::depth_words(double mm) const {
    return fixed(shown(mm), metric_ ? 1 : 2) + " " + std::string(depth_unit());
}

std::string ChartUnits::rate_words(double mm_per_h) const {
    return fixed(shown(mm_per_h), metric_ ? 1 : 2) + " " + std::string(rate_unit());
}

}  // namespace rainledger
