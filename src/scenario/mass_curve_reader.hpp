#pragma once

#include <optional>
#include <string>
#include <string_view>

#include "rainledger/rain/mass_curve.hpp"
#include "rainledger/reference/mass_curves.hpp"
#include "scenario/yaml.hpp"

// The dimensionless mass curve of a design storm.
namespace rainledger {

/// A curve with where it is from.
struct ReadMassCurve {
    MassCurve curve;
    std::string words;                      ///< as in DesignOrigin
    const MassCurveEntry* entry = nullptr;  ///< of a published one
};

/// The curve by the keys `curve`, which must be there, and `interpolate`. What is wrong is
/// reported.
[[nodiscard]] std::optional<ReadMassCurve> read_mass_curve(const ClosedMap& design);

/// What to write for a published curve that the trade calls otherwise ("type_ii", "huff"): "'curve:
/// nrcs_II'". Empty for other words.
[[nodiscard]] std::string meant_curve(std::string_view typed);

}  // namespace rainledger
