#pragma once

#include <string>
#include <string_view>

#include "rainledger/base/printable.hpp"
#include "rainledger/base/quantity.hpp"
#include "rainledger/report/summary.hpp"

namespace rainledger {

/// Quantities as people read them, in one set of units.
class Display {
public:
    explicit Display(DisplayUnits units) : units_(units) {}

    /// Numbers without their unit, for table cells.
    [[nodiscard]] std::string depth(double mm) const;       ///< to 0.1 mm or 0.01 in
    [[nodiscard]] std::string rate(double mm_per_h) const;  ///< likewise per hour
    [[nodiscard]] std::string volume(double m3) const;      ///< three figures
    [[nodiscard]] std::string flow(double l_per_s) const;   ///< three figures
    [[nodiscard]] std::string area(double m2, std::string_view unit) const;

    [[nodiscard]] std::string_view depth_unit() const;
    [[nodiscard]] std::string_view depth_words() const;  ///< where "in" could be misread
    [[nodiscard]] std::string_view rate_unit() const;
    [[nodiscard]] std::string_view volume_unit() const;
    [[nodiscard]] std::string_view flow_unit() const;
    /// The unit in which the areas of a site of `site_m2` read well.
    [[nodiscard]] std::string_view area_unit(double site_m2) const;

    /// A depth with its unit; a depth that would print as zero and is not is "under 0.1 mm".
    [[nodiscard]] std::string depth_with_unit(double mm) const;
    /// A parameter with its unit, to four figures at most, without zeros at its end.
    [[nodiscard]] std::string parameter(double canonical, Dimension dimension) const;

private:
    [[nodiscard]] bool metric() const { return units_ == DisplayUnits::metric; }
    [[nodiscard]] std::string_view unit_of(Dimension dimension) const;

    DisplayUnits units_;
};

/// A plain number to four figures at most, without zeros at its end.
[[nodiscard]] std::string four_figures(double value);

}  // namespace rainledger
