#include "rainledger/reference/texture_class.hpp"

#include <array>
#include <cstddef>

#include "rainledger/reference/names.hpp"

namespace rainledger {
namespace {

constexpr std::array<std::string_view, 12> kNames{
    "sand",
    "loamy sand",
    "sandy loam",
    "loam",
    "silt loam",
    "silt",
    "sandy clay loam",
    "clay loam",
    "silty clay loam",
    "sandy clay",
    "silty clay",
    "clay",
};

}  // namespace

std::span<const std::string_view> texture_names() {
    return kNames;
}

std::string_view texture_name(TextureClass texture) {
    return kNames[static_cast<std::size_t>(texture)];
}

std::optional<TextureClass> find_texture(std::string_view typed) {
    const auto at = find_name(typed, kNames);
    if (!at) return std::nullopt;
    return static_cast<TextureClass>(*at);
}

}  // namespace rainledger
