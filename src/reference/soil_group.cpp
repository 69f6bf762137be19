#include "rainledger/reference/soil_group.hpp"

#include <array>
#include <cmath>
#include <cstddef>
#include <limits>

#include "rainledger/base/cut.hpp"
#include "rainledger/reference/names.hpp"
#include "reference/printed_units.hpp"
#include "reference/sources.hpp"

namespace rainledger {
namespace {

constexpr Provenance kTable71{&sources::kNeh7, "table 7-1", Status::from_memory,
                              "title of the chapter and the depths 50 and 60 cm confirmed"};

/// The bounds of conductivity as printed, micrometres per second.
struct Bounds {
    double above_for_A, above_for_B, above_for_C;
};
constexpr Bounds kShallow{40.0, 10.0, 1.0};
constexpr Bounds kDeep{10.0, 4.0, 0.4};

constexpr SoilGroupRow row(std::string_view name, double down_to_cm, const Bounds& bounds,
                           bool dual) {
    constexpr double kUnit = printed::kMmPerHourPerMicrometreSecond;
    SoilGroupRow made;
    made.name = name;
    made.conductivity_depth_mm = ValueRange{0.0, down_to_cm * printed::kMmPerCm};
    made.above_for_A_mm_per_h = bounds.above_for_A * kUnit;
    made.above_for_B_mm_per_h = bounds.above_for_B * kUnit;
    made.above_for_C_mm_per_h = bounds.above_for_C * kUnit;
    made.dual = dual;
    made.provenance = kTable71;
    return made;
}

constexpr SoilGroupRow always_D(std::string_view name) {
    constexpr double kNever = std::numeric_limits<double>::infinity();
    SoilGroupRow made;
    made.name = name;
    made.above_for_A_mm_per_h = made.above_for_B_mm_per_h = made.above_for_C_mm_per_h = kNever;
    made.provenance = kTable71;
    return made;
}

enum Row : std::size_t {
    shallow_rock,
    middling_rock_high_water,
    middling_rock,
    deep_high_water,
    deep_middling_water,
    deep,
};

constexpr std::array<SoilGroupRow, 6> kRows{{
    always_D("impermeable layer within 50 cm"),
    row("impermeable layer at 50 to 100 cm, water table within 60 cm", 60.0, kShallow, true),
    row("impermeable layer at 50 to 100 cm, water table at 60 cm or deeper", 50.0, kShallow, false),
    row("no impermeable layer within 100 cm, water table within 60 cm", 100.0, kDeep, true),
    row("no impermeable layer within 100 cm, water table at 60 to 100 cm", 50.0, kShallow, false),
    row("no impermeable layer and no water table within 100 cm", 100.0, kDeep, false),
}};

bool within(const std::optional<double>& depth_mm, double cm) {
    return depth_mm && *depth_mm < cm * printed::kMmPerCm;
}

bool down_to(const std::optional<double>& depth_mm, double cm) {
    return depth_mm && *depth_mm <= cm * printed::kMmPerCm;
}

const SoilGroupRow& row_for(const SoilProfile& profile) {
    const bool high_water = within(profile.water_table_depth_mm, 60.0);
    if (within(profile.impermeable_depth_mm, 50.0)) return kRows[shallow_rock];
    if (down_to(profile.impermeable_depth_mm, 100.0))
        return kRows[high_water ? middling_rock_high_water : middling_rock];
    if (high_water) return kRows[deep_high_water];
    return kRows[down_to(profile.water_table_depth_mm, 100.0) ? deep_middling_water : deep];
}

SoilGroup drained_group(const SoilGroupRow& row, double conductivity_mm_per_h) {
    if (conductivity_mm_per_h > row.above_for_A_mm_per_h) return SoilGroup::A;
    if (conductivity_mm_per_h > row.above_for_B_mm_per_h) return SoilGroup::B;
    if (conductivity_mm_per_h > row.above_for_C_mm_per_h) return SoilGroup::C;
    return SoilGroup::D;
}

bool is_amount(double value) {
    return std::isfinite(value) && value >= 0.0;
}

std::string profile_problem(const SoilProfile& profile) {
    if (!is_amount(profile.conductivity_mm_per_h))
        return "the conductivity must be 0 or more, and finite";
    if (profile.impermeable_depth_mm && !is_amount(*profile.impermeable_depth_mm))
        return "the depth to an impermeable layer must be 0 or more, and finite";
    if (profile.water_table_depth_mm && !is_amount(*profile.water_table_depth_mm))
        return "the depth to the water table must be 0 or more, and finite";
    return {};
}

constexpr std::array<std::string_view, 4> kNames{"A", "B", "C", "D"};

}  // namespace

std::string_view soil_group_name(SoilGroup group) {
    return kNames[static_cast<std::size_t>(group)];
}

std::string rating_name(const SoilGroupRating& rating) {
    std::string name(soil_group_name(rating.drained));
    if (rating.dual()) name += "/" + std::string(soil_group_name(rating.undrained));
    return name;
}

Answer<SoilGroupRating> parse_soil_group(std::string_view typed) {
    using enum SoilGroup;
    for (const SoilGroup group : {A, B, C, D}) {
        if (same_name(typed, soil_group_name(group)))
            return {SoilGroupRating{group, group}, {}, {}};
        const std::string name(soil_group_name(group));
        if (group != D && (same_name(typed, name + "/D") || same_name(typed, name + "D")))
            return {SoilGroupRating{group, D}, {}, {}};
    }
    return refusal<SoilGroupRating>("unknown soil group " + in_quotes(typed),
                                    "known here: A, B, C, D, A/D, B/D, C/D");
}

std::span<const SoilGroupRow> soil_group_rows() {
    return kRows;
}

Answer<RatedSoil> rated_soil(const SoilProfile& profile) {
    std::string problem = profile_problem(profile);
    if (!problem.empty()) return refusal<RatedSoil>(std::move(problem));
    const SoilGroupRow& row = row_for(profile);
    const SoilGroup drained = drained_group(row, profile.conductivity_mm_per_h);
    return {RatedSoil{{drained, row.dual ? SoilGroup::D : drained}, &row}, {}, {}};
}

RowView view_of(const SoilGroupRow& row) {
    RowView view{std::string(row.name), {}, {}, row.provenance};
    if (!row.conductivity_depth_mm) {
        view.notes.emplace_back("group D whatever the conductivity");
        return view;
    }
    const auto bound = [](std::string_view key, std::string_view label, double mm_per_h) {
        return ValueView{key, label, Dimension::rate, "um/s", printed::value(mm_per_h)};
    };
    view.values = {{"conductivity_depth_mm",
                    "depth that the conductivity is for",
                    Dimension::depth,
                    "cm",
                    {{}, row.conductivity_depth_mm}},
                   bound("above_for_a_mm_per_h", "faster is A", row.above_for_A_mm_per_h),
                   bound("above_for_b_mm_per_h", "faster is B", row.above_for_B_mm_per_h),
                   bound("above_for_c_mm_per_h", "faster is C, else D", row.above_for_C_mm_per_h)};
    if (row.dual) view.notes.emplace_back("A/D, B/D and C/D: the letter D holds where not drained");
    return view;
}

std::optional<SoilGroup> soil_group_of_texture(TextureClass texture) {
    switch (texture) {
        case TextureClass::sand:
        case TextureClass::loamy_sand:
        case TextureClass::sandy_loam:
            return SoilGroup::A;
        case TextureClass::silt_loam:
        case TextureClass::loam:
            return SoilGroup::B;
        case TextureClass::sandy_clay_loam:
            return SoilGroup::C;
        case TextureClass::silt:
            return std::nullopt;
        case TextureClass::clay_loam:
        case TextureClass::silty_clay_loam:
        case TextureClass::sandy_clay:
        case TextureClass::silty_clay:
        case TextureClass::clay:
            break;
    }
    return SoilGroup::D;
}

const Provenance& texture_key_provenance() {
    static constexpr Provenance kProvenance{&sources::kTr55, "appendix A, key by texture",
                                            Status::from_memory};
    return kProvenance;
}

}  // namespace rainledger
