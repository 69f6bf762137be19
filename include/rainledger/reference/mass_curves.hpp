#pragma once

#include <span>
#include <string_view>

// Published dimensionless mass curves of storms: the share of the storm's depth that has fallen by
// a share of its duration.
namespace rainledger {

/// One ordinate. Both shares run from 0 to 1.
struct MassPoint {
    double time = 0.0;
    double depth = 0.0;
};

/// A published curve with where it comes from and the durations that it was made for.
struct MassCurveEntry {
    std::string_view name;    ///< as scenarios write it: "nrcs_II", "huff_2"
    std::string_view title;   ///< as people read it: "NRCS type II", "Huff second quartile, median"
    std::string_view source;  ///< author, title, year, table; with its status
    std::span<const MassPoint> points;  ///< from (0, 0) to (1, 1), times rising
    /// Durations for which the source offers it: 24 h alone for the NRCS curves; of Huff's, the
    /// quartile that Circular 173 recommends (up to 6 h, to 12 h, to 24 h, longer; from memory).
    double shortest_h = 0.0;  ///< 0 where there is no lower limit
    double longest_h = 0.0;   ///< infinite where there is no upper one
};

/// nrcs_I, nrcs_IA, nrcs_II, nrcs_III, huff_1 to huff_4, in this order.
[[nodiscard]] std::span<const MassCurveEntry> mass_curve_table();

/// The curve of that name, if there is one.
[[nodiscard]] const MassCurveEntry* find_mass_curve(std::string_view name);

}  // namespace rainledger
