#pragma once

#include <cstddef>
#include <string_view>

// The look of the pictures. Few inks, each of a lightness of its own, so that they stay apart in a
// greyscale print and for every kind of colour vision: lightness (CIE L*) runs 94, 82, 77, 66, 49,
// 25 from the initial loss to the excess. Lengths are page units of 1/96 inch.
namespace rainledger {

inline constexpr std::string_view kInk = "#1F2933";
inline constexpr std::string_view kQuiet = "#5A6670";  // second-rank words
inline constexpr std::string_view kAxis = "#7C8791";
inline constexpr std::string_view kGuide = "#E1E5E8";
inline constexpr std::string_view kPaper = "#FFFFFF";

inline constexpr std::string_view kRain = "#A9BFCF";
inline constexpr std::string_view kRainEdge = "#6C8BA3";
inline constexpr std::string_view kRainWords = "#43607A";
inline constexpr std::string_view kRunOn = "#6C8BA3";
inline constexpr std::string_view kInitialLoss = "#ECEEF0";
inline constexpr std::string_view kInfiltrated = "#E6CBA4";
inline constexpr std::string_view kInfiltration = "#A3581C";  // its line
inline constexpr std::string_view kPonded = "#90A3AE";
inline constexpr std::string_view kExcess = "#1F3F57";

inline constexpr double kPageWidth = 640.0;    // 17 cm
inline constexpr double kPagePixels = 1400.0;  // of a PNG: 209 to the inch
inline constexpr double kTitleSize = 14.0;     // 10.5 points
inline constexpr double kTextSize = 12.0;      // 9 points
inline constexpr double kSmallSize = 10.0;     // 7.5 points: the line at the foot

inline constexpr double kMargin = 14.0;
inline constexpr double kTickRoom = 40.0;  // beside an axis, for its numbers

inline constexpr double kLine = 1.6;
inline constexpr double kDashedLine = 1.4;
inline constexpr double kThinLine = 0.8;

/// The most steps that a panel draws one by one: about two pixels each in a PNG across the page.
inline constexpr std::size_t kMostDrawn = 700;
inline constexpr std::size_t kMostPanels = 12;
inline constexpr std::size_t kTextColumns = 100;  // of a chart in text

}  // namespace rainledger
