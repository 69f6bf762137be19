#pragma once

#include <optional>
#include <string>

#include "rainledger/reference/soil_texture.hpp"
#include "rainledger/report/lookup_topics.hpp"

// What soil and texture share.
namespace rainledger {

/// A row of Rawls, Brakensiek and Miller in full, with the deficit and the fragment.
[[nodiscard]] LookupSection green_ampt_section(const GreenAmptTexture& row,
                                               const LookupAsked& asked);

/// What is wrong with the saturation, if one is given: outside 0 to 1, or not finite.
[[nodiscard]] std::string saturation_problem(const LookupAsked& asked);

/// The line of a fragment for the deficit that a porosity gives at the saturation asked for, or a
/// comment that leaves it to the user. `porosity_words`: "the effective porosity 0.434".
[[nodiscard]] std::string deficit_yaml(double effective_porosity, std::string_view porosity_words,
                                       const LookupAsked& asked);

/// The group that the key by texture gives; the key does not hold silt.
[[nodiscard]] std::optional<LookupSection> group_by_texture(TextureClass texture);

/// "half of it, 6.6 mm/h, is what Green and Ampt's law takes (Bouwer ...)".
[[nodiscard]] std::string half_conductivity_words(double saturated_mm_per_h,
                                                  const LookupAsked& asked);

}  // namespace rainledger
