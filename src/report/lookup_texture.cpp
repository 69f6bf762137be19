#include <fmt/core.h>

#include "rainledger/reference/pedotransfer.hpp"
#include "rainledger/reference/texture_triangle.hpp"
#include "report/lookup_find.hpp"
#include "report/lookup_parts.hpp"
#include "report/lookup_soil.hpp"

// From the grains of a soil to its class and parameters.
namespace rainledger {
namespace {

constexpr double kTableOrganicPercent = 2.5;  // of Saxton and Rawls (2006), table 3, from memory

std::string percent(double value) {
    return four_figures(value) + " %";
}

/// What is asked, with its class.
struct Soil {
    ParticleShares shares;
    double organic_percent = kTableOrganicPercent;
    TextureClass texture = TextureClass::sand;
};

LookupSection class_section(const Soil& soil) {
    const auto share = [](std::string_view key, std::string_view label, double figure) {
        return ValueView{key, label, {}, "", {figure, {}}};
    };
    RowView view{std::string(texture_name(soil.texture)),
                 {share("sand_percent", "sand, %", soil.shares.sand_percent),
                  share("silt_percent", "silt, % (the rest)", silt_percent(soil.shares)),
                  share("clay_percent", "clay, %", soil.shares.clay_percent)},
                 {},
                 texture_triangle_provenance()};
    return {"Texture class", {std::move(view)}, std::string(texture_name(soil.texture)), {}, {}};
}

/// The porosity that the regressions of 1985 are given, and where it comes from.
struct Porosity {
    double value = 0.0;
    std::string origin;
};

std::optional<Porosity> porosity_of(const Soil& soil, const LookupAsked& asked) {
    if (asked.porosity) return Porosity{*asked.porosity, "as given"};
    if (const GreenAmptTexture* row = green_ampt_texture(soil.texture))
        return Porosity{
            *row->porosity.value,
            fmt::format("the mean of {} (Rawls, Brakensiek and Miller 1983); --porosity "
                        "sets your own",
                        row->name)};
    const auto water = saxton_rawls_soil(soil.shares, soil.organic_percent);
    if (!water.value) return std::nullopt;
    return Porosity{water.value->saturation,
                    "the saturation of Saxton and Rawls, since there is no mean of silt; "
                    "--porosity sets your own"};
}

/// The fragment of the regressions of 1985: their suction, and half of their conductivity.
std::string regression_yaml(const RawlsBrakensiekSoil& found, const Porosity& porosity,
                            const LookupAsked& asked) {
    std::string words =
        "Rawls and Brakensiek 1985, regressions; conductivity at half Ks (Bouwer "
        "1966)";
    if (!found.caution.empty()) words += "; " + found.caution;
    std::string out = yaml_comment(words) + "losses:\n  green_ampt:\n";
    out += "    effective_conductivity: " +
           four_figures(kBouwerShare * found.saturated_conductivity_mm_per_h) + " mm/h\n";
    out += "    wetting_front_suction: " + four_figures(found.suction_mm) + " mm\n";
    const double effective = porosity.value - found.residual_content;
    return out + deficit_yaml(effective,
                              fmt::format("porosity {} less residual water, {}",
                                          four_figures(porosity.value), four_figures(effective)),
                              asked);
}

Answer<LookupSection> regression_section(const Soil& soil, const LookupAsked& asked) {
    LookupSection section{"By regression on sand, clay and porosity", {}, {}, {}, {}};
    const auto porosity = porosity_of(soil, asked);
    if (!porosity) {
        section.lines.emplace_back("They need a porosity, and none is known here; add --porosity.");
        return {std::move(section), {}, {}};
    }
    const auto found = rawls_brakensiek_soil(soil.shares, porosity->value);
    if (!found.value) return refusal<LookupSection>(found.problem, found.hint);
    section.rows.push_back(view_of(*found.value));
    if (!found.value->caution.empty())
        section.lines.push_back("Caution: " + found.value->caution + ".");
    section.lines.push_back(
        fmt::format("Porosity {}: {}.", four_figures(porosity->value), porosity->origin));
    section.lines.emplace_back("Made for sand of 5 to 70 % and clay of 5 to 60 %.");
    section.lines.push_back(
        half_conductivity_words(found.value->saturated_conductivity_mm_per_h, asked));
    section.yaml = regression_yaml(*found.value, *porosity, asked);
    return {std::move(section), {}, {}};
}

LookupSection water_section(const Soil& soil, const LookupAsked& asked) {
    LookupSection section{"By regression on sand, clay and organic matter", {}, {}, {}, {}};
    const auto found = saxton_rawls_soil(soil.shares, soil.organic_percent);
    if (!found.value) {
        section.lines.push_back("None here: " + found.problem + "; " + found.hint + ".");
        return section;
    }
    section.rows.push_back(view_of(*found.value));
    if (!found.value->caution.empty())
        section.lines.push_back("Caution: " + found.value->caution + ".");
    section.lines.push_back(fmt::format(
        "Organic matter {} by weight{}. Made for clay up to 60 % and organic matter up to 8 %.",
        percent(soil.organic_percent),
        asked.organic_percent ? "" : ", as in table 3 of the source; --organic sets your own"));
    section.lines.push_back(
        half_conductivity_words(found.value->saturated_conductivity_mm_per_h, asked));
    return section;
}

LookupSection class_means(const Soil& soil, const LookupAsked& asked) {
    if (const GreenAmptTexture* row = green_ampt_texture(soil.texture))
        return green_ampt_section(*row, asked);
    LookupSection section{"Green-Ampt parameters by soil texture", {}, {}, {}, {}};
    section.lines.emplace_back("Rawls, Brakensiek and Miller (1983) give no parameters of silt.");
    return section;
}

/// Shares that look like fractions of one: hardly any soil has so little of both.
bool look_like_fractions(const ParticleShares& shares) {
    const auto small = [](double share) { return share > 0.0 && share < 1.0; };
    return small(shares.sand_percent) && small(shares.clay_percent);
}

Answer<Soil> soil_asked(const LookupAsked& asked) {
    if (!asked.sand_percent || !asked.clay_percent)
        return refusal<Soil>("texture needs --sand and --clay in percent",
                             "write 'rainledger lookup texture --sand 42 --clay 18'");
    Soil soil{{*asked.sand_percent, *asked.clay_percent},
              asked.organic_percent.value_or(kTableOrganicPercent),
              {}};
    if (look_like_fractions(soil.shares))
        return refusal<Soil>(
            fmt::format("sand of {} and clay of {} look like fractions of one",
                        percent(soil.shares.sand_percent), percent(soil.shares.clay_percent)),
            "write them in percent, such as --sand 42 --clay 18");
    const auto texture = texture_of(soil.shares);
    if (!texture.value) return refusal<Soil>(texture.problem, texture.hint);
    soil.texture = *texture.value;
    return {soil, {}, {}};
}

}  // namespace

LookupAnswer look_up_texture(const LookupAsked& asked) {
    if (std::string problem = saturation_problem(asked); !problem.empty())
        return refused(std::move(problem));
    if (!asked.name.empty())
        return refused("texture goes by --sand and --clay and takes no name",
                       "'rainledger lookup soil' goes by the name of a class");
    const auto soil = soil_asked(asked);
    if (!soil.value) return refused(soil.problem, soil.hint);
    auto regression = regression_section(*soil.value, asked);
    if (!regression.value) return refused(regression.problem, regression.hint);
    std::vector<LookupSection> sections{class_section(*soil.value), class_means(*soil.value, asked),
                                        *std::move(regression.value),
                                        water_section(*soil.value, asked)};
    sections.back().lines.emplace_back(
        "Means of a class and regressions answer different questions and do not meet; where they "
        "lie far apart, a test on the site decides.");
    if (auto group = group_by_texture(soil.value->texture)) sections.push_back(*std::move(group));
    return {std::move(sections), {}, {}};
}

}  // namespace rainledger
