#include "rainledger/reference/mass_curves.hpp"

#include <array>
#include <cstddef>
#include <limits>

namespace rainledger {
namespace {

constexpr std::size_t kNrcsRows = 23;

constexpr std::array<double, kNrcsRows> kNrcsHours{0.0,  2.0,  4.0,  6.0,  7.0,  8.0,  8.5,   9.0,
                                                   9.5,  9.75, 10.0, 10.5, 11.0, 11.5, 11.75, 12.0,
                                                   12.5, 13.0, 13.5, 14.0, 16.0, 20.0, 24.0};

constexpr std::array<double, kNrcsRows> kTypeI{
    0.0,   0.035, 0.076, 0.125, 0.156, 0.194, 0.219, 0.254, 0.303, 0.362, 0.515, 0.583,
    0.624, 0.654, 0.669, 0.682, 0.706, 0.727, 0.748, 0.767, 0.830, 0.926, 1.0};
constexpr std::array<double, kNrcsRows> kTypeIA{
    0.0,   0.050, 0.116, 0.206, 0.268, 0.425, 0.480, 0.520, 0.550, 0.564, 0.577, 0.601,
    0.624, 0.645, 0.655, 0.664, 0.683, 0.701, 0.719, 0.736, 0.800, 0.906, 1.0};
constexpr std::array<double, kNrcsRows> kTypeII{
    0.0,   0.022, 0.048, 0.080, 0.098, 0.120, 0.133, 0.147, 0.163, 0.172, 0.181, 0.204,
    0.235, 0.283, 0.357, 0.663, 0.735, 0.772, 0.799, 0.820, 0.880, 0.952, 1.0};
constexpr std::array<double, kNrcsRows> kTypeIII{
    0.0,   0.020, 0.043, 0.072, 0.089, 0.115, 0.130, 0.148, 0.167, 0.178, 0.189, 0.216,
    0.250, 0.298, 0.339, 0.500, 0.702, 0.751, 0.785, 0.811, 0.886, 0.957, 1.0};

constexpr std::size_t kHuffRows = 21;

// Per cent of the depth at 0, 5, ..., 100 per cent of the duration.
constexpr std::array<int, kHuffRows> kFirstQuartile{0,  16, 33, 43, 52, 60, 66, 71, 75, 79, 82,
                                                    84, 86, 88, 90, 92, 94, 96, 97, 98, 100};
constexpr std::array<int, kHuffRows> kSecondQuartile{0,  3,  8,  12, 16, 22, 29, 39, 51, 62, 70,
                                                     76, 81, 85, 88, 91, 93, 95, 97, 98, 100};
constexpr std::array<int, kHuffRows> kThirdQuartile{0,  3,  6,  9,  12, 15, 19, 23, 27, 32, 38,
                                                    45, 57, 70, 79, 85, 89, 92, 95, 97, 100};
constexpr std::array<int, kHuffRows> kFourthQuartile{0,  2,  5,  8,  10, 13, 16, 19, 22, 25, 28,
                                                     32, 35, 39, 45, 51, 59, 72, 84, 92, 100};

constexpr std::array<MassPoint, kNrcsRows> nrcs(const std::array<double, kNrcsRows>& depth) {
    std::array<MassPoint, kNrcsRows> out{};
    for (std::size_t i = 0; i < kNrcsRows; ++i)
        out[i] = {kNrcsHours[i] / 24.0, depth[i]};
    return out;
}

constexpr std::array<MassPoint, kHuffRows> huff(const std::array<int, kHuffRows>& per_cent) {
    std::array<MassPoint, kHuffRows> out{};
    for (std::size_t i = 0; i < kHuffRows; ++i)
        out[i] = {static_cast<double>(i) / (kHuffRows - 1), per_cent[i] / 100.0};
    return out;
}

constexpr auto kNrcsI = nrcs(kTypeI);
constexpr auto kNrcsIA = nrcs(kTypeIA);
constexpr auto kNrcsII = nrcs(kTypeII);
constexpr auto kNrcsIII = nrcs(kTypeIII);
constexpr auto kHuff1 = huff(kFirstQuartile);
constexpr auto kHuff2 = huff(kSecondQuartile);
constexpr auto kHuff3 = huff(kThirdQuartile);
constexpr auto kHuff4 = huff(kFourthQuartile);

constexpr std::string_view kNrcsSource =
    "Chow, Maidment and Mays, Applied Hydrology, 1988, table 14.4.3, after the US Soil "
    "Conservation Service, 1986; from memory";
constexpr std::string_view kHuffSource =
    "Huff, Time distributions of heavy rainstorms in Illinois, Illinois State Water Survey "
    "Circular 173, 1990, median curves of point rainfall; from memory";

constexpr double kNoLimit_h = std::numeric_limits<double>::infinity();

constexpr std::array<MassCurveEntry, 8> kCurves{{
    {"nrcs_I", "NRCS type I", kNrcsSource, kNrcsI, 24.0, 24.0},
    {"nrcs_IA", "NRCS type IA", kNrcsSource, kNrcsIA, 24.0, 24.0},
    {"nrcs_II", "NRCS type II", kNrcsSource, kNrcsII, 24.0, 24.0},
    {"nrcs_III", "NRCS type III", kNrcsSource, kNrcsIII, 24.0, 24.0},
    {"huff_1", "Huff first quartile, median", kHuffSource, kHuff1, 0.0, 6.0},
    {"huff_2", "Huff second quartile, median", kHuffSource, kHuff2, 6.0, 12.0},
    {"huff_3", "Huff third quartile, median", kHuffSource, kHuff3, 12.0, 24.0},
    {"huff_4", "Huff fourth quartile, median", kHuffSource, kHuff4, 24.0, kNoLimit_h},
}};

}  // namespace

std::span<const MassCurveEntry> mass_curve_table() {
    return kCurves;
}

const MassCurveEntry* find_mass_curve(std::string_view name) {
    for (const MassCurveEntry& entry : kCurves)
        if (entry.name == name) return &entry;
    return nullptr;
}

}  // namespace rainledger
