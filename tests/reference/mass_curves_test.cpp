#include "rainledger/reference/mass_curves.hpp"

#include <algorithm>
#include <cmath>
#include <string>
#include <vector>

#include "test.hpp"

namespace rainledger {

TEST_CASE("the mass curves stand in their order, each with its source and its durations") {
    std::vector<std::string> names;
    for (const MassCurveEntry& entry : mass_curve_table()) {
        INFO(entry.name);
        names.emplace_back(entry.name);
        CHECK_FALSE(entry.title.empty());
        CHECK_THAT(std::string(entry.source), Contains("from memory"));
        CHECK(entry.shortest_h <= entry.longest_h);
        CHECK(find_mass_curve(entry.name) == &entry);
    }
    CHECK(names == std::vector<std::string>{"nrcs_I", "nrcs_IA", "nrcs_II", "nrcs_III", "huff_1",
                                            "huff_2", "huff_3", "huff_4"});
    CHECK(find_mass_curve("nrcs_ii") == nullptr);
    CHECK(find_mass_curve("") == nullptr);
}

TEST_CASE("every mass curve runs from nothing to all, times rising and depths not falling") {
    for (const MassCurveEntry& entry : mass_curve_table()) {
        INFO(entry.name);
        REQUIRE(entry.points.size() > 2);
        CHECK(entry.points.front().time == 0.0);
        CHECK(entry.points.front().depth == 0.0);
        CHECK(entry.points.back().time == 1.0);
        CHECK(entry.points.back().depth == 1.0);
        for (std::size_t i = 1; i < entry.points.size(); ++i) {
            CHECK(entry.points[i].time > entry.points[i - 1].time);
            CHECK(entry.points[i].depth > entry.points[i - 1].depth);
        }
    }
}

// Huff 1990 offers each quartile for a class of durations, and the classes leave nothing out.
TEST_CASE("the classes of durations of the quartiles adjoin") {
    const auto curves = mass_curve_table().subspan(4);
    CHECK(curves.front().shortest_h == 0.0);
    CHECK(std::isinf(curves.back().longest_h));
    for (std::size_t i = 1; i < curves.size(); ++i)
        CHECK(curves[i].shortest_h == curves[i - 1].longest_h);
}

}  // namespace rainledger
