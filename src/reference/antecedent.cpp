#include "rainledger/reference/antecedent.hpp"

#include <algorithm>
#include <array>

#include "reference/sources.hpp"

namespace rainledger {
namespace {

// {II, I, III}
constexpr std::array<AntecedentRow, 77> kRows{{
    {100, 100, 100}, {99, 97, 100}, {98, 94, 99}, {97, 91, 99}, {96, 89, 99}, {95, 87, 98},
    {94, 85, 98},    {93, 83, 98},  {92, 81, 97}, {91, 80, 97}, {90, 78, 96}, {89, 76, 96},
    {88, 75, 95},    {87, 73, 95},  {86, 72, 94}, {85, 70, 94}, {84, 68, 93}, {83, 67, 93},
    {82, 66, 92},    {81, 64, 92},  {80, 63, 91}, {79, 62, 91}, {78, 60, 90}, {77, 59, 89},
    {76, 58, 89},    {75, 57, 88},  {74, 55, 88}, {73, 54, 87}, {72, 53, 86}, {71, 52, 86},
    {70, 51, 85},    {69, 50, 84},  {68, 48, 84}, {67, 47, 83}, {66, 46, 82}, {65, 45, 82},
    {64, 44, 81},    {63, 43, 80},  {62, 42, 79}, {61, 41, 78}, {60, 40, 78}, {59, 39, 77},
    {58, 38, 76},    {57, 37, 75},  {56, 36, 75}, {55, 35, 74}, {54, 34, 73}, {53, 33, 72},
    {52, 32, 71},    {51, 31, 70},  {50, 31, 70}, {49, 30, 69}, {48, 29, 68}, {47, 28, 67},
    {46, 27, 66},    {45, 26, 65},  {44, 25, 64}, {43, 25, 63}, {42, 24, 62}, {41, 23, 61},
    {40, 22, 60},    {39, 21, 59},  {38, 21, 58}, {37, 20, 57}, {36, 19, 56}, {35, 18, 55},
    {34, 18, 54},    {33, 17, 53},  {32, 16, 52}, {31, 16, 51}, {30, 15, 50}, {25, 12, 43},
    {20, 9, 37},     {15, 6, 30},   {10, 4, 22},  {5, 2, 13},   {0, 0, 0},
}};

constexpr Provenance kRecalled{&sources::kNeh10, "table 10-1", Status::from_memory};
constexpr Provenance kSeen{&sources::kNeh10, "table 10-1", Status::confirmed,
                           "in Beven, table B6.3.2, after USDA-SCS 1985"};
constexpr std::array kSeenNumbers{100.0, 90.0, 80.0, 70.0, 60.0, 50.0, 40.0, 30.0};

double interpolated(double number, int AntecedentRow::*column) {
    for (std::size_t i = 1; i < kRows.size(); ++i) {
        const AntecedentRow& above = kRows[i - 1];
        const AntecedentRow& below = kRows[i];
        if (number < below.condition_2) continue;
        const double share = (number - below.condition_2) / (above.condition_2 - below.condition_2);
        return below.*column + share * (above.*column - below.*column);
    }
    return 0.0;
}

}  // namespace

std::span<const AntecedentRow> antecedent_table() {
    return kRows;
}

const Provenance& antecedent_provenance(double condition_2) {
    return std::ranges::find(kSeenNumbers, condition_2) == kSeenNumbers.end() ? kRecalled : kSeen;
}

double antecedent_dry(double condition_2) {
    return interpolated(condition_2, &AntecedentRow::condition_1);
}

double antecedent_wet(double condition_2) {
    return interpolated(condition_2, &AntecedentRow::condition_3);
}

}  // namespace rainledger
