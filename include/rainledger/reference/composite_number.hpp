#pragma once

#include <string_view>

#include "rainledger/reference/answer.hpp"
#include "rainledger/reference/provenance.hpp"

// One curve number for an area that is partly impervious (USDA, TR-55, 1986, figures 2-3 and 2-4
// as equations, from memory; impervious parts have a number of 98).
namespace rainledger {

inline constexpr double kImperviousNumber = 98.0;
/// Figure 2-4 is for less impervious area than this share; above, the soil that is left takes in
/// little of the runoff that crosses it, and figure 2-3 is used.
inline constexpr double kLeastShareAsConnected = 0.30;

/// An area: the number of its pervious part, 0 < CN <= 100; the share that is impervious, and the
/// share of the impervious part that drains straight to the drainage system, both 0 to 1.
struct PartlyImpervious {
    double pervious_number = 0.0;
    double impervious_share = 0.0;
    double connected_share = 1.0;
};

/// The number, and by which figure: "figure 2-3" or "figure 2-4".
struct CompositeNumber {
    double number = 0.0;
    Provenance provenance;
};

/// Figure 2-3, all connected: CNp + p (98 - CNp); figure 2-4, some not, p < 0.30:
/// CNp + p (98 - CNp) (1 - 0.5 R), with p the impervious share and R its unconnected share. Values
/// outside their ranges, and NaN, are refused.
[[nodiscard]] Answer<CompositeNumber> composite_number(const PartlyImpervious& area);

}  // namespace rainledger
