#pragma once

#include <optional>
#include <span>
#include <string_view>

#include "rainledger/reference/provenance.hpp"
#include "rainledger/reference/published_value.hpp"
#include "rainledger/reference/texture_class.hpp"

// Soil parameters by USDA texture class.
namespace rainledger {

/// A row of Rawls, Brakensiek and Miller (1983), 11 classes (there is none for silt). Porosities as
/// fractions. Ranges are about one standard deviation either side; that of the suction is of its
/// logarithm. Printed in cm and cm/h. Numbers that do not fit are kept as printed, with the fault
/// beside.
struct GreenAmptTexture {
    std::string_view name;
    TextureClass texture = TextureClass::sand;
    PublishedValue porosity;
    PublishedValue effective_porosity;
    PublishedValue suction_mm;             ///< wetting-front suction head
    PublishedValue conductivity_mm_per_h;  ///< effective, for Green and Ampt; about Ks/2
    std::optional<PrintedFault> porosity_fault = {};
    std::optional<PrintedFault> effective_porosity_fault = {};
    std::optional<PrintedFault> conductivity_fault = {};
    Provenance provenance;
};

[[nodiscard]] std::span<const GreenAmptTexture> green_ampt_textures();
/// The row of a class; null for silt, which the source does not hold.
[[nodiscard]] const GreenAmptTexture* green_ampt_texture(TextureClass texture);

/// The moisture deficit that a row gives at an effective saturation of 0 to 1, measured from the
/// effective porosity: (1 - Se) theta_e (Chow, Maidment and Mays 1988, eq. 4.3.10, from memory).
/// `effective_porosity` is the row's as printed, or the corrected one of its fault.
[[nodiscard]] double moisture_deficit(double effective_porosity, double effective_saturation);

/// A row of Rawls, Brakensiek and Saxton (1982): saturated conductivity, and water held at 33 kPa
/// and at 1500 kPa as fractions of the volume. Conductivity printed in cm/h.
struct SoilWaterTexture {
    std::string_view name;
    TextureClass texture = TextureClass::sand;
    PublishedValue saturated_conductivity_mm_per_h;
    PublishedValue field_capacity;
    PublishedValue wilting_point;
    Provenance provenance;
};

[[nodiscard]] std::span<const SoilWaterTexture> soil_water_textures();
/// The row of a class; null for silt, which the source does not hold.
[[nodiscard]] const SoilWaterTexture* soil_water_texture(TextureClass texture);

[[nodiscard]] RowView view_of(const GreenAmptTexture& row);
[[nodiscard]] RowView view_of(const SoilWaterTexture& row);

/// The share of the saturated conductivity that Green and Ampt's law takes where the source gives
/// Ks alone, with its provenance (Bouwer 1966).
inline constexpr double kBouwerShare = 0.5;
[[nodiscard]] const Provenance& bouwer_share_provenance();

}  // namespace rainledger
