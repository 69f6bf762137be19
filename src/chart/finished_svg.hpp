#pragma once

#include <string>
#include <string_view>

namespace rainledger {

/// gnuplot's SVG made sound: its title element says what is shown (and no others remain), bold is
/// bold (gnuplot names a font "sans-serif:Bold" that no viewer knows), and "]]>" in words is as XML
/// wants it.
[[nodiscard]] std::string finished_svg(std::string svg, std::string_view title);

}  // namespace rainledger
