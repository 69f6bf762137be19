#include "report/lookup_soil.hpp"

#include <fmt/core.h>

#include "rainledger/reference/soil_group.hpp"
#include "report/lookup_find.hpp"
#include "report/lookup_parts.hpp"

namespace rainledger {
namespace {

constexpr std::string_view kGreenAmpt = "Green-Ampt parameters by soil texture";
constexpr std::string_view kSoilWater = "Saturated conductivity and soil water by texture";

/// The porosity that a deficit is measured from: the corrected one where the printed one is at
/// fault.
double sound_effective_porosity(const GreenAmptTexture& row) {
    const auto& fault = row.effective_porosity_fault;
    return fault && fault->corrected ? *fault->corrected : *row.effective_porosity.value;
}

std::string porosity_words(const GreenAmptTexture& row) {
    const double sound = sound_effective_porosity(row);
    std::string out = "the effective porosity " + plain_number(sound);
    if (sound != *row.effective_porosity.value)
        out += " (printed " + plain_number(*row.effective_porosity.value) + ", a misprint)";
    return out;
}

std::string deficit_line(const GreenAmptTexture& row, const LookupAsked& asked) {
    const double porosity = sound_effective_porosity(row);
    if (asked.saturation)
        return fmt::format(
            "Moisture deficit {}: (1 - effective saturation of {} %) times {} (Chow, Maidment and "
            "Mays 1988, eq. 4.3.10, from memory).",
            four_figures(moisture_deficit(porosity, *asked.saturation)),
            four_figures(100.0 * *asked.saturation), porosity_words(row));
    return fmt::format(
        "The moisture deficit is yours to set, from 0 when wet to {} when dry: (1 - effective "
        "saturation) times {}. --saturation '40 %' fills it in.",
        plain_number(porosity), porosity_words(row));
}

/// Faults of what stands in the fragment, for its comments, in the source's unit.
std::string fault_comment(const RowView& view, std::string_view key) {
    const ValueView& value = value_of(view, key);
    if (!value.fault) return {};
    std::string words = std::string(value.label) + ": " + std::string(value.fault->words);
    if (value.fault->corrected)
        words += "; corrected: " + as_printed(*value.fault->corrected, value);
    return yaml_comment(words);
}

std::string green_ampt_yaml(const GreenAmptTexture& row, const RowView& view,
                            const LookupAsked& asked) {
    const auto printed = [&](std::string_view key) {
        const ValueView& value = value_of(view, key);
        return as_printed(*value.published.value, value);
    };
    std::string out = yaml_comment(view.name + ", as printed: " + short_citation(row.provenance));
    out += fault_comment(view, "effective_conductivity_mm_per_h");
    out += "losses:\n  green_ampt:\n";
    out += "    effective_conductivity: " + printed("effective_conductivity_mm_per_h") + "\n";
    out += "    wetting_front_suction: " + printed("wetting_front_suction_mm") + "\n";
    return out + deficit_yaml(sound_effective_porosity(row), porosity_words(row), asked);
}

LookupSection water_section(const SoilWaterTexture& row, const LookupAsked& asked) {
    const double saturated = *row.saturated_conductivity_mm_per_h.value;
    return {std::string(kSoilWater),
            {view_of(row)},
            {},
            {half_conductivity_words(saturated, asked)},
            {}};
}

LookupAnswer several(const std::vector<const GreenAmptTexture*>& rows, const LookupAsked& asked) {
    if (asked.saturation)
        return refused("--saturation fills in the deficit of one soil, and " +
                           std::to_string(rows.size()) + " are shown",
                       "name one, such as 'rainledger lookup soil loam'");
    LookupSection green{std::string(kGreenAmpt), views_of(rows), {}, {}, {}};
    green.lines.emplace_back(
        "One soil by name is shown with a fragment for a scenario: rainledger lookup soil loam.");
    LookupSection water{std::string(kSoilWater), {}, {}, {}, {}};
    for (const GreenAmptTexture* row : rows)
        water.rows.push_back(view_of(*soil_water_texture(row->texture)));
    return {std::vector<LookupSection>{std::move(green), std::move(water)}, {}, {}};
}

}  // namespace

std::string saturation_problem(const LookupAsked& asked) {
    if (!asked.saturation || (*asked.saturation >= 0.0 && *asked.saturation <= 1.0)) return {};
    return "the effective saturation must lie between 0 and 1";
}

std::string deficit_yaml(double effective_porosity, std::string_view porosity_words,
                         const LookupAsked& asked) {
    constexpr std::string_view kHang = "    # ";
    constexpr std::size_t kWidth = kLookupWidth - kFragmentIndent;
    if (!asked.saturation)
        return filled("    # moisture_deficit: yours to set, ",
                      fmt::format("0 (wet) to {} (dry), measured from {}",
                                  four_figures(effective_porosity), porosity_words),
                      kHang, kWidth);
    return filled("    # ",
                  fmt::format("effective saturation {} %, measured from {}",
                              four_figures(100.0 * *asked.saturation), porosity_words),
                  kHang, kWidth) +
           fmt::format("    moisture_deficit: {}\n",
                       four_figures(moisture_deficit(effective_porosity, *asked.saturation)));
}

std::string half_conductivity_words(double saturated_mm_per_h, const LookupAsked& asked) {
    const Display display(asked.units);
    return fmt::format(
        "Half of the saturated conductivity, {}, is what the law of Green and Ampt takes where a "
        "source gives Ks alone: {}.",
        display.parameter(kBouwerShare * saturated_mm_per_h, Dimension::rate),
        citation(bouwer_share_provenance()));
}

LookupSection green_ampt_section(const GreenAmptTexture& row, const LookupAsked& asked) {
    RowView view = view_of(row);
    LookupSection section{std::string(kGreenAmpt), {}, {}, {deficit_line(row, asked)}, {}};
    section.lines.emplace_back(
        "Within a class the suction alone scatters over a factor of ten and more, as its range "
        "says; "
        "a test on the site goes before the table.");
    section.yaml = green_ampt_yaml(row, view, asked);
    section.rows.push_back(std::move(view));
    return section;
}

std::optional<LookupSection> group_by_texture(TextureClass texture) {
    const auto group = soil_group_of_texture(texture);
    if (!group) return std::nullopt;
    LookupSection section{
        "Hydrologic soil group by the older key of texture",
        {RowView{std::string(texture_name(texture)), {}, {}, texture_key_provenance()}},
        std::string(soil_group_name(*group)),
        {},
        {}};
    section.lines.emplace_back(
        "A soil survey, or conductivity and depths (rainledger lookup soil-group --conductivity), "
        "go before the key.");
    return section;
}

LookupAnswer look_up_soil(const LookupAsked& asked) {
    if (std::string problem = saturation_problem(asked); !problem.empty())
        return refused(std::move(problem));
    if (find_texture(asked.name) == TextureClass::silt)
        return refused(
            "Rawls, Brakensiek and Miller (1983) give no parameters of silt",
            "'rainledger lookup texture --sand 8 --clay 6' estimates one from its grains");
    const auto rows = rows_asked(green_ampt_textures(), "soil", asked.name);
    if (!rows.value) return refused(rows.problem, rows.hint);
    if (rows.value->size() > 1) return several(*rows.value, asked);
    const GreenAmptTexture& row = *rows.value->front();
    LookupSection green = green_ampt_section(row, asked);
    add_line(green, others_line(green_ampt_textures(), *rows.value, asked.name));
    std::vector<LookupSection> sections{std::move(green),
                                        water_section(*soil_water_texture(row.texture), asked)};
    if (auto group = group_by_texture(row.texture)) sections.push_back(*std::move(group));
    return {std::move(sections), {}, {}};
}

}  // namespace rainledger
