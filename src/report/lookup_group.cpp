#include <fmt/core.h>

#include "report/lookup_find.hpp"
#include "report/lookup_parts.hpp"
#include "report/lookup_soil.hpp"

// Hydrologic soil groups.
namespace rainledger {
namespace {

LookupAnswer group_of_name(const LookupAsked& asked) {
    const auto texture = find_texture(asked.name);
    if (!texture)
        return refused("no texture class is named " + in_quotes(asked.name),
                       suggestion(asked.name, texture_names()));
    auto section = group_by_texture(*texture);
    if (!section)
        return refused("the key by texture of TR-55 does not hold " + asked.name,
                       "its conductivity rates it: --conductivity '3.4 mm/h'");
    return answered(*std::move(section));
}

LookupAnswer whole_table() {
    LookupSection section{"Hydrologic soil group by conductivity and depths", {}, {}, {}, {}};
    for (const SoilGroupRow& row : soil_group_rows())
        section.rows.push_back(view_of(row));
    section.lines.emplace_back(
        "--conductivity '3.4 mm/h', with --impermeable-layer '1.2 m' and --water-table '2 m' where "
        "they are known, rates a soil; a texture class by name asks the older key.");
    return answered(std::move(section));
}

std::string profile_words(const LookupAsked& asked) {
    const Display display(asked.units);
    const auto depth = [&](const std::optional<double>& depth_mm) {
        return depth_mm ? "at " + display.parameter(*depth_mm, Dimension::depth)
                        : std::string("not given, and taken to lie deeper than the table looks");
    };
    return fmt::format(
        "Asked: saturated conductivity of the layer that transmits least {}; impermeable layer {}; "
        "highest water table of a year {}.",
        display.parameter(*asked.conductivity_mm_per_h, Dimension::rate),
        depth(asked.impermeable_depth_mm), depth(asked.water_table_depth_mm));
}

LookupAnswer group_of_profile(const LookupAsked& asked) {
    const auto rated = rated_soil(
        {*asked.conductivity_mm_per_h, asked.impermeable_depth_mm, asked.water_table_depth_mm});
    if (!rated.value) return refused(rated.problem, rated.hint);
    const SoilGroupRating& rating = rated.value->rating;
    LookupSection section{"Hydrologic soil group by conductivity and depths",
                          {view_of(*rated.value->row)},
                          rating_name(rating),
                          {profile_words(asked)},
                          {}};
    if (rating.dual())
        section.lines.push_back(fmt::format(
            "Group {} where drains hold the water table down at 60 cm or deeper, group D where "
            "they do not.",
            soil_group_name(rating.drained)));
    return answered(std::move(section));
}

}  // namespace

LookupAnswer look_up_soil_group(const LookupAsked& asked) {
    if (asked.conductivity_mm_per_h && !asked.name.empty())
        return refused("--conductivity rates a soil and takes no name beside it",
                       "leave out " + in_quotes(asked.name));
    if (asked.conductivity_mm_per_h) return group_of_profile(asked);
    if (asked.impermeable_depth_mm || asked.water_table_depth_mm)
        return refused("depths alone rate no soil; add --conductivity '3.4 mm/h'");
    return asked.name.empty() ? whole_table() : group_of_name(asked);
}

}  // namespace rainledger
