#include "rainledger/reference/texture_triangle.hpp"

#include <cmath>
#include <cstddef>

#include "rainledger/base/number.hpp"
#include "reference/sources.hpp"

namespace rainledger {
namespace {

// Percentages come with a few decimals; a billionth of a percent is beyond all of them.
constexpr double kFinest = 1.0e9;

double rounded(double percent) {
    return std::round(percent * kFinest) / kFinest;
}

/// The shares and the two sums by which the sandy classes are told apart.
struct Point {
    double sand;
    double silt;
    double clay;
    double sandiness;  ///< silt + 1.5 clay
    double loaminess;  ///< silt + 2 clay
};

Point point_of(const ParticleShares& shares) {
    const double silt = silt_percent(shares);
    return {shares.sand_percent, silt, shares.clay_percent,
            rounded(silt + 1.5 * shares.clay_percent), rounded(silt + 2.0 * shares.clay_percent)};
}

bool is_sandy_loam(const Point& p) {
    const bool with_clay = p.clay >= 7.0 && p.clay < 20.0 && p.sand > 52.0;
    const bool without = p.clay < 7.0 && p.silt < 50.0;
    return p.loaminess >= 30.0 && (with_clay || without);
}

bool is_silt_loam(const Point& p) {
    const bool with_clay = p.clay >= 12.0 && p.clay < 27.0 && p.silt >= 50.0;
    return with_clay || (p.clay < 12.0 && p.silt >= 50.0 && p.silt < 80.0);
}

bool is_coarse_loam(const Point& p) {
    return p.clay >= 7.0 && p.clay < 27.0 && p.silt >= 28.0 && p.silt < 50.0 && p.sand <= 52.0;
}

bool between_loam_and_clay(const Point& p) {
    return p.clay >= 27.0 && p.clay < 40.0;
}

bool holds(TextureClass texture, const Point& p) {
    switch (texture) {
        case TextureClass::sand:
            return p.sandiness < 15.0;
        case TextureClass::loamy_sand:
            return p.sandiness >= 15.0 && p.loaminess < 30.0;
        case TextureClass::sandy_loam:
            return is_sandy_loam(p);
        case TextureClass::loam:
            return is_coarse_loam(p);
        case TextureClass::silt_loam:
            return is_silt_loam(p);
        case TextureClass::silt:
            return p.silt >= 80.0 && p.clay < 12.0;
        case TextureClass::sandy_clay_loam:
            return p.clay >= 20.0 && p.clay < 35.0 && p.silt < 28.0 && p.sand > 45.0;
        case TextureClass::clay_loam:
            return between_loam_and_clay(p) && p.sand > 20.0 && p.sand <= 45.0;
        case TextureClass::silty_clay_loam:
            return between_loam_and_clay(p) && p.sand <= 20.0;
        case TextureClass::sandy_clay:
            return p.clay >= 35.0 && p.sand > 45.0;
        case TextureClass::silty_clay:
            return p.clay >= 40.0 && p.silt >= 40.0;
        case TextureClass::clay:
            break;
    }
    return p.clay >= 40.0 && p.sand <= 45.0 && p.silt < 40.0;
}

std::string percent_problem(std::string_view what, double percent) {
    if (!std::isfinite(percent)) return std::string(what) + " is not a finite number";
    if (percent < 0.0) return std::string(what) + " is " + shortest(percent) + " %, below 0";
    if (percent > 100.0) return std::string(what) + " is " + shortest(percent) + " %, above 100";
    return {};
}

}  // namespace

double silt_percent(const ParticleShares& shares) {
    return rounded(100.0 - shares.sand_percent - shares.clay_percent);
}

std::string shares_problem(const ParticleShares& shares) {
    if (auto problem = percent_problem("sand", shares.sand_percent); !problem.empty())
        return problem;
    if (auto problem = percent_problem("clay", shares.clay_percent); !problem.empty())
        return problem;
    if (silt_percent(shares) >= 0.0) return {};
    return "sand and clay together are " +
           shortest(rounded(shares.sand_percent + shares.clay_percent)) + " %, more than 100";
}

bool belongs_to(TextureClass texture, const ParticleShares& shares) {
    return holds(texture, point_of(shares));
}

Answer<TextureClass> texture_of(const ParticleShares& shares) {
    std::string problem = shares_problem(shares);
    if (!problem.empty())
        return refusal<TextureClass>(std::move(problem),
                                     "silt is what sand and clay leave of 100 %");
    const Point point = point_of(shares);
    TextureClass found = TextureClass::clay;
    for (std::size_t i = 0; i < texture_names().size(); ++i)
        if (holds(static_cast<TextureClass>(i), point)) found = static_cast<TextureClass>(i);
    return {found, {}, {}};
}

const Provenance& texture_triangle_provenance() {
    static constexpr Provenance kProvenance{
        &sources::kSoilSurveyManual, "definitions of the texture classes", Status::from_memory};
    return kProvenance;
}

}  // namespace rainledger
