#pragma once

#include <optional>
#include <string>
#include <vector>

#include "rainledger/reference/answer.hpp"
#include "rainledger/reference/cover_numbers.hpp"
#include "rainledger/reference/soil_group.hpp"
#include "rainledger/report/lookup_report.hpp"

// What can be looked up. Every figure comes out of the reference room; here the rows that answer a
// question are put together with what a practitioner must know beside them.
namespace rainledger {

/// A question. A topic looks at its own members and at no others.
struct LookupAsked {
    std::string name;  ///< of a row, or a curve number; empty asks for the whole table
    DisplayUnits units = DisplayUnits::metric;  ///< of the figures in sentences

    std::optional<double> saturation = {};  ///< effective saturation, 0 to 1: soil and texture

    std::optional<std::string> treatment = {};  ///< these: cover
    std::optional<HydrologicCondition> condition = {};
    std::optional<SoilGroupRating> soil_group = {};
    std::optional<double> impervious_share = {};  ///< 0 to 1
    std::optional<double> connected_share = {};   ///< of the impervious part, 0 to 1

    std::optional<double> slope_percent = {};  ///< storage

    std::optional<double> rain_mm = {};  ///< these: interception
    std::optional<double> crop_height_mm = {};

    std::optional<double> conductivity_mm_per_h = {};  ///< these: soil_group
    std::optional<double> impermeable_depth_mm = {};
    std::optional<double> water_table_depth_mm = {};

    std::optional<double> sand_percent = {};  ///< these: texture
    std::optional<double> clay_percent = {};
    std::optional<double> organic_percent = {};  ///< 2.5 where it is not given
    std::optional<double> porosity = {};         ///< that of the class where it is not given
};

/// Sections, or what is wrong with the question: an unknown name with the nearest known one, a part
/// that is missing or does not go with the rest.
using LookupAnswer = Answer<std::vector<LookupSection>>;

/// Green-Ampt parameters and soil water by texture class.
[[nodiscard]] LookupAnswer look_up_soil(const LookupAsked& asked);
/// Curve numbers by cover, and of an area that is partly impervious.
[[nodiscard]] LookupAnswer look_up_cover(const LookupAsked& asked);
/// Horton's parameters by soil and cover.
[[nodiscard]] LookupAnswer look_up_horton(const LookupAsked& asked);
/// Depression storage and surface retention.
[[nodiscard]] LookupAnswer look_up_storage(const LookupAsked& asked);
/// Interception by plants, and in a storm of a depth.
[[nodiscard]] LookupAnswer look_up_interception(const LookupAsked& asked);
/// Typical steady infiltration rates.
[[nodiscard]] LookupAnswer look_up_steady_rate(const LookupAsked& asked);
/// The hydrologic soil group, from conductivity and depths or from the name of a texture class.
[[nodiscard]] LookupAnswer look_up_soil_group(const LookupAsked& asked);
/// A curve number for antecedent runoff conditions I and III.
[[nodiscard]] LookupAnswer look_up_antecedent(const LookupAsked& asked);
/// Texture class and soil parameters from sand, clay and organic matter.
[[nodiscard]] LookupAnswer look_up_texture(const LookupAsked& asked);

}  // namespace rainledger
