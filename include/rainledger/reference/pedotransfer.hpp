#pragma once

#include <optional>
#include <string>

#include "rainledger/reference/answer.hpp"
#include "rainledger/reference/provenance.hpp"
#include "rainledger/reference/published_value.hpp"
#include "rainledger/reference/texture_triangle.hpp"

// Soil parameters from sand, clay, porosity and organic matter by published regressions. A
// regression at the middle of a texture class does not return the class's mean of many soils
// (soil_texture.hpp): they answer different questions.
namespace rainledger {

/// What the regressions of Rawls and Brakensiek (1985) give, and the suction by way of Brooks and
/// Corey's parameters: (2 + 3 lambda)/(1 + 3 lambda) hb/2.
struct RawlsBrakensiekSoil {
    double suction_mm = 0.0;                       ///< wetting-front suction, by its regression
    double suction_by_brooks_corey_mm = 0.0;       ///< the same by hb and lambda
    double saturated_conductivity_mm_per_h = 0.0;  ///< Ks
    double bubbling_pressure_mm = 0.0;             ///< hb
    double pore_index = 0.0;                       ///< lambda
    double residual_content = 0.0;                 ///< a fraction of the volume
    std::string caution;  ///< what lies outside the soils of the source; empty if nothing
};

/// Made for sand between 5 and 70 % and clay between 5 and 60 %, both ends left out; outside, the
/// numbers are an extrapolation and the caution says so. A porosity outside 0 to 1, and shares with
/// a problem, are refused.
[[nodiscard]] Answer<RawlsBrakensiekSoil> rawls_brakensiek_soil(const ParticleShares& shares,
                                                                double porosity);

/// What Saxton and Rawls (2006) give: water contents as fractions of the volume.
struct SaxtonRawlsSoil {
    double wilting_point = 0.0;                    ///< at 1500 kPa, eq. 1
    double field_capacity = 0.0;                   ///< at 33 kPa, eq. 2
    double saturation = 0.0;                       ///< eq. 5
    double available_water = 0.0;                  ///< field capacity less wilting point
    std::optional<double> air_entry_mm = {};       ///< tension at air entry, eq. 4, as head; empty
                                                   ///< where the equation gives less than 0
    double pore_index = 0.0;                       ///< lambda, eq. 18
    double saturated_conductivity_mm_per_h = 0.0;  ///< eq. 16
    double density_g_per_cm3 = 0.0;                ///< of the dry soil, eq. 6
    std::string caution;  ///< what lies outside the soils of the source; empty if nothing
};

/// Organic matter in percent by weight. Made for clay up to 60 % and organic matter up to 8 %;
/// outside, the caution says so. Shares with a problem, organic matter outside 0 to 100, and soils
/// for which the equations give no rising order of water contents are refused.
[[nodiscard]] Answer<SaxtonRawlsSoil> saxton_rawls_soil(const ParticleShares& shares,
                                                        double organic_percent);

[[nodiscard]] const Provenance& rawls_brakensiek_provenance();
[[nodiscard]] const Provenance& saxton_rawls_provenance();

/// The same as rows for showing. The caution is not part of the row: show it beside.
[[nodiscard]] RowView view_of(const RawlsBrakensiekSoil& soil);
[[nodiscard]] RowView view_of(const SaxtonRawlsSoil& soil);

}  // namespace rainledger
