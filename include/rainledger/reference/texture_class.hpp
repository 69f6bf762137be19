#pragma once

#include <optional>
#include <span>
#include <string_view>

// The twelve texture classes of the USDA.
namespace rainledger {

enum class TextureClass {
    sand,
    loamy_sand,
    sandy_loam,
    loam,
    silt_loam,
    silt,
    sandy_clay_loam,
    clay_loam,
    silty_clay_loam,
    sandy_clay,
    silty_clay,
    clay,
};

/// All twelve names, in the order of the enumeration: "sandy loam".
[[nodiscard]] std::span<const std::string_view> texture_names();

[[nodiscard]] std::string_view texture_name(TextureClass texture);

/// The class of that name, read forgivingly.
[[nodiscard]] std::optional<TextureClass> find_texture(std::string_view typed);

}  // namespace rainledger
