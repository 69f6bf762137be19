#pragma once

#include <optional>
#include <span>
#include <string>
#include <string_view>

#include "rainledger/reference/answer.hpp"
#include "rainledger/reference/provenance.hpp"
#include "rainledger/reference/published_value.hpp"
#include "rainledger/reference/texture_class.hpp"

// The hydrologic soil groups of the NRCS.
namespace rainledger {

enum class SoilGroup { A, B, C, D };

/// "A".
[[nodiscard]] std::string_view soil_group_name(SoilGroup group);

/// A soil's rating: one group, or two where a high water table makes a soil D that would be better
/// drained ("B/D").
struct SoilGroupRating {
    SoilGroup drained = SoilGroup::D;
    SoilGroup undrained = SoilGroup::D;

    [[nodiscard]] bool dual() const { return drained != undrained; }
};

/// "B", or "B/D".
[[nodiscard]] std::string rating_name(const SoilGroupRating& rating);

/// Reads "b", "B/D", "BD". A dual rating ends in D.
[[nodiscard]] Answer<SoilGroupRating> parse_soil_group(std::string_view typed);

/// A row of table 7-1 of the National Engineering Handbook, Part 630. Depths as printed in cm, the
/// conductivity's bounds as printed in micrometres per second; the in/h beside them are rounded.
struct SoilGroupRow {
    std::string_view name;                                 ///< which depths, in words
    std::optional<ValueRange> conductivity_depth_mm = {};  ///< of the layer that transmits least
    double above_for_A_mm_per_h = 0.0;  ///< faster than this is A, then B, then C, else D
    double above_for_B_mm_per_h = 0.0;
    double above_for_C_mm_per_h = 0.0;
    bool dual = false;  ///< A, B and C are A/D, B/D and C/D
    Provenance provenance;
};

[[nodiscard]] std::span<const SoilGroupRow> soil_group_rows();
[[nodiscard]] RowView view_of(const SoilGroupRow& row);

/// What the table asks of a soil. A depth that is not given is deeper than the table looks (1 m).
struct SoilProfile {
    double conductivity_mm_per_h = 0.0;  ///< saturated, of the layer that transmits least
    std::optional<double> impermeable_depth_mm = {};
    std::optional<double> water_table_depth_mm = {};  ///< of the highest level in a year
};

/// A rating and the row that it comes from.
struct RatedSoil {
    SoilGroupRating rating;
    const SoilGroupRow* row = nullptr;
};

/// The rating by table 7-1; a conductivity or depth below 0, or not finite, is refused.
[[nodiscard]] Answer<RatedSoil> rated_soil(const SoilProfile& profile);

/// The older key by texture of TR-55, appendix A; it does not hold silt.
[[nodiscard]] std::optional<SoilGroup> soil_group_of_texture(TextureClass texture);
[[nodiscard]] const Provenance& texture_key_provenance();

}  // namespace rainledger
