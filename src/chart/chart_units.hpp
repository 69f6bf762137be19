#pragma once

#include <string>
#include <string_view>

#include "rainledger/report/summary.hpp"

namespace rainledger {

/// Depths and rates in the units of a chart.
class ChartUnits {
public:
    explicit ChartUnits(DisplayUnits units);

    /// A depth in mm as a number on an axis; a rate in mm/h likewise.
    [[nodiscard]] double shown(double mm) const { return mm / mm_per_unit_; }

    [[nodiscard]] std::string_view depth_unit() const { return metric_ ? "mm" : "in"; }
    [[nodiscard]] std::string_view rate_unit() const { return metric_ ? "mm/h" : "in/h"; }

    /// To 0.1 mm or 0.01 in, with the unit.
    [[nodiscard]] std::string depth_words(double mm) const;
    [[nodiscard]] std::string rate_words(double mm_per_h) const;

private:
    bool metric_;
    double mm_per_unit_;
};

}  // namespace rainledger
