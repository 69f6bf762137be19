#include "rainledger/reference/interception_values.hpp"

#include <algorithm>
#include <array>
#include <cmath>
#include <string>

#include "reference/printed_units.hpp"
#include "reference/sources.hpp"

namespace rainledger {
namespace {

constexpr Provenance kFormulas{&sources::kHorton1919, "interception in a storm",
                               Status::from_memory, "after Viessman and Lewis"};

constexpr InterceptionRow plants(std::string_view name, double constant_in, double share,
                                 double exponent = 1.0) {
    return {name, constant_in, share, exponent, false, kFormulas};
}

constexpr InterceptionRow crop(std::string_view name, double constant_in, double share) {
    return {name, constant_in, share, 1.0, true, kFormulas};
}

constexpr std::array<InterceptionRow, 11> kRows{{
    plants("orchards", 0.04, 0.18),
    plants("ash woods", 0.02, 0.18),
    plants("beech or maple woods", 0.04, 0.18),
    plants("oak woods", 0.05, 0.18),
    plants("willow shrubs", 0.02, 0.40),
    plants("hemlock and pine", 0.05, 0.20, 0.5),
    crop("beans, potatoes", 0.02, 0.15),
    crop("clover and meadow", 0.005, 0.08),
    crop("alfalfa", 0.01, 0.10),
    crop("small grains", 0.005, 0.05),
    crop("corn", 0.005, 0.005),
}};

std::string height_problem(const InterceptionRow& row, std::optional<double> crop_height_mm) {
    const std::string name(row.name);
    if (!row.per_foot_of_height)
        return crop_height_mm ? "the formula of " + name + " takes no height" : std::string{};
    if (!crop_height_mm) return "the formula of " + name + " needs the height of the crop";
    if (*crop_height_mm > 0.0 && std::isfinite(*crop_height_mm)) return {};
    return "the height of the crop must be above 0, and finite";
}

}  // namespace

std::span<const InterceptionRow> interception_rows() {
    return kRows;
}

RowView view_of(const InterceptionRow& row) {
    RowView view{std::string(row.name),
                 {{"constant_in", "a, inches", {}, "", {row.constant_in, {}}},
                  {"share", "b", {}, "", {row.share, {}}},
                  {"exponent", "n", {}, "", {row.exponent, {}}}},
                 {},
                 row.provenance};
    view.notes.emplace_back(row.per_foot_of_height
                                ? "held: (a + b P^n) h inches, P in inches, h the height in feet"
                                : "held: a + b P^n inches, P in inches");
    return view;
}

Answer<double> interception_mm(const InterceptionRow& row, double rain_mm,
                               std::optional<double> crop_height_mm) {
    if (!(rain_mm >= 0.0) || !std::isfinite(rain_mm))
        return refusal<double>("the rain must be 0 or more, and finite");
    std::string problem = height_problem(row, crop_height_mm);
    if (!problem.empty()) return refusal<double>(std::move(problem));
    const double height_ft = crop_height_mm ? *crop_height_mm / printed::kMmPerFoot : 1.0;
    const double rain_in = rain_mm / printed::kMmPerInch;
    const double held_in = row.constant_in + row.share * std::pow(rain_in, row.exponent);
    return {std::min(rain_mm, held_in * height_ft * printed::kMmPerInch), {}, {}};
}

}  // namespace rainledger
