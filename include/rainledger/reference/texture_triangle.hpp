#pragma once

#include <string>

#include "rainledger/reference/answer.hpp"
#include "rainledger/reference/provenance.hpp"
#include "rainledger/reference/texture_class.hpp"

// The texture triangle: a class from the shares of sand, silt and clay (USDA, Soil Survey Manual,
// Handbook 18, definitions of the texture classes in words; from memory). Where a definition
// leaves open to which class a boundary belongs, the boundaries are closed so that every point of
// the triangle belongs to exactly one class:
//
//   sand             silt + 1.5 clay < 15
//   loamy sand       silt + 1.5 clay >= 15 and silt + 2 clay < 30
//   sandy loam       silt + 2 clay >= 30, and 7 <= clay < 20 with sand > 52,
//                    or clay < 7 with silt < 50
//   loam             7 <= clay < 27, 28 <= silt < 50, sand <= 52
//   silt loam        silt >= 50 with 12 <= clay < 27, or 50 <= silt < 80 with clay < 12
//   silt             silt >= 80, clay < 12
//   sandy clay loam  20 <= clay < 35, silt < 28, sand > 45
//   clay loam        27 <= clay < 40, 20 < sand <= 45
//   silty clay loam  27 <= clay < 40, sand <= 20
//   sandy clay       clay >= 35, sand > 45
//   silty clay       clay >= 40, silt >= 40
//   clay             clay >= 40, sand <= 45, silt < 40
namespace rainledger {

/// Shares by weight of the mineral part finer than 2 mm, percent; silt is the rest of 100.
struct ParticleShares {
    double sand_percent = 0.0;
    double clay_percent = 0.0;
};

/// The rest of 100, rounded to 1e-9 so that boundaries fall as they do in decimal arithmetic.
[[nodiscard]] double silt_percent(const ParticleShares& shares);

/// What is wrong with the shares: not finite, below 0, or more than 100 together; empty if nothing.
[[nodiscard]] std::string shares_problem(const ParticleShares& shares);

/// True if the definition of `texture` holds; the shares must be without a problem.
[[nodiscard]] bool belongs_to(TextureClass texture, const ParticleShares& shares);

/// The one class to which the shares belong.
[[nodiscard]] Answer<TextureClass> texture_of(const ParticleShares& shares);

/// Where the definitions come from.
[[nodiscard]] const Provenance& texture_triangle_provenance();

}  // namespace rainledger
