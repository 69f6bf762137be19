#pragma once

#include <cstddef>
#include <string>
#include <variant>
#include <vector>

#include "rainledger/losses/constant_rate.hpp"
#include "rainledger/losses/curve_number.hpp"
#include "rainledger/losses/green_ampt.hpp"
#include "rainledger/losses/horton.hpp"
#include "rainledger/losses/philip.hpp"

// A surface of the site, and the site: plain values.
namespace rainledger {

/// What becomes of water in depression storage.
enum class PondedWater {
    infiltrates,  ///< it goes on infiltrating at capacity until it is gone
    held,         ///< it never drains within the event
};

/// Whichever way a surface loses its rain.
using Losses = std::variant<Horton, HortonElapsed, GreenAmpt, Philip, ConstantRate, PhiIndex,
                            Impervious, CurveNumber>;

/// A share of a surface's excess that runs onto another surface of the site.
struct RunsOnto {
    std::size_t surface = 0;  ///< index in Site::surfaces
    double share = 1.0;       ///< 0 < share <= 1; the shares of one surface sum to at most 1
};

/// Depths in mm over the surface's own area.
struct Surface {
    std::string name;
    double area_m2 = 0.0;  ///< > 0
    std::string drains_to = "outlet";
    double interception_mm = 0.0;        ///< >= 0; 0 for a curve number
    double depression_storage_mm = 0.0;  ///< >= 0; 0 for a curve number
    PondedWater ponded_water = PondedWater::infiltrates;
    Losses losses = Impervious{};
    std::vector<RunsOnto> runs_onto = {};
};

/// The surfaces of a site, in the user's order. runs_onto has no loops.
struct Site {
    std::vector<Surface> surfaces;
};

/// The number of a curve-number surface converted to its antecedent condition (NEH Part 630 table
/// 10-1), and the retention curve that follows.
[[nodiscard]] double converted_number(const CurveNumber& given);
[[nodiscard]] RetentionCurve retention_curve(const CurveNumber& given);

}  // namespace rainledger
