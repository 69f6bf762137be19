#include "rainledger/reference/texture_triangle.hpp"

#include <array>
#include <cstddef>
#include <limits>
#include <utility>

#include "test.hpp"

namespace rainledger {
namespace {

int classes_at(const ParticleShares& shares) {
    int count = 0;
    for (std::size_t i = 0; i < texture_names().size(); ++i)
        if (belongs_to(static_cast<TextureClass>(i), shares)) ++count;
    return count;
}

TextureClass class_at(double sand, double clay) {
    const auto answer = texture_of({sand, clay});
    REQUIRE(answer.value);
    return *answer.value;
}

}  // namespace

TEST_CASE("every point of the triangle belongs to exactly one class") {
    // Steps of a fifth and of a third of a percent: on every boundary and between them.
    for (const double parts : {5.0, 3.0}) {
        std::array<int, 12> seen{};
        const int whole = static_cast<int>(100.0 * parts);
        for (int sand = 0; sand <= whole; ++sand)
            for (int clay = 0; sand + clay <= whole; ++clay) {
                const ParticleShares shares{sand / parts, clay / parts};
                if (classes_at(shares) != 1) {
                    INFO("sand " << shares.sand_percent << " clay " << shares.clay_percent);
                    FAIL("belongs to " << classes_at(shares) << " classes");
                }
                ++seen[static_cast<std::size_t>(*texture_of(shares).value)];
            }
        for (const int count : seen)
            CHECK(count > 0);
    }
}

// Corners of the classes in the chart of the Soil Survey Manual, as sand and clay, from memory.
// Points a tenth of a percent to either side of a corner must fall into the classes that meet.
TEST_CASE("classes meet where the chart has their corners") {
    using enum TextureClass;
    CHECK(class_at(45.1, 34.9) == sandy_clay_loam);  // the corner at sand 45, clay 35
    CHECK(class_at(45.1, 35.1) == sandy_clay);
    CHECK(class_at(44.9, 34.9) == clay_loam);
    CHECK(class_at(44.9, 39.9) == clay_loam);  // the corner at sand 45, clay 40
    CHECK(class_at(44.9, 40.1) == clay);
    CHECK(class_at(20.1, 39.8) == clay_loam);  // the corner at sand 20, clay 40
    CHECK(class_at(19.9, 39.9) == silty_clay_loam);
    CHECK(class_at(20.1, 40.1) == clay);
    CHECK(class_at(19.8, 40.1) == silty_clay);
    CHECK(class_at(20.1, 27.1) == clay_loam);  // the corner at sand 20, clay 27
    CHECK(class_at(19.9, 27.1) == silty_clay_loam);
    CHECK(class_at(20.1, 26.9) == silt_loam);
    CHECK(class_at(23.2, 26.9) == loam);
    CHECK(class_at(52.1, 19.9) == sandy_loam);  // the corner at sand 52, clay 20
    CHECK(class_at(51.9, 19.9) == loam);
    CHECK(class_at(52.1, 20.1) == sandy_clay_loam);
    CHECK(class_at(42.9, 6.9) == silt_loam);  // the corner at sand 43, clay 7
    CHECK(class_at(43.2, 6.9) == sandy_loam);
    CHECK(class_at(42.8, 7.3) == loam);
    CHECK(class_at(7.9, 11.9) == silt);  // the corner at sand 8, clay 12
    CHECK(class_at(7.9, 12.1) == silt_loam);
    CHECK(class_at(8.2, 11.9) == silt_loam);
    CHECK(class_at(85.0, 9.9) == loamy_sand);  // the corner at sand 85, clay 10 and 15
    CHECK(class_at(90.1, 9.9) == sand);
    CHECK(class_at(70.0, 0.1) == sandy_loam);
    CHECK(class_at(70.3, 0.0) == loamy_sand);
    CHECK(class_at(100.0, 0.0) == sand);
    CHECK(class_at(0.0, 100.0) == clay);
    CHECK(class_at(0.0, 0.0) == silt);
}

// In doubles 100 - 35.9 - 14.1 is 49.99999999999999, which would make a loam of a silt loam.
TEST_CASE("a boundary falls as it does in decimal arithmetic") {
    REQUIRE(100.0 - 35.9 - 14.1 < 50.0);
    CHECK(silt_percent({35.9, 14.1}) == 50.0);
    CHECK(class_at(35.9, 14.1) == TextureClass::silt_loam);
    CHECK(class_at(36.0, 14.1) == TextureClass::loam);
}

TEST_CASE("shares that are no soil are refused in words") {
    constexpr double kNone = std::numeric_limits<double>::quiet_NaN();
    constexpr double kEndless = std::numeric_limits<double>::infinity();
    const auto problem = [](double sand, double clay) { return texture_of({sand, clay}).problem; };
    CHECK(problem(70.0, 30.5) == "sand and clay together are 100.5 %, more than 100");
    CHECK(problem(-1.0, 30.0) == "sand is -1 %, below 0");
    CHECK(problem(10.0, -0.5) == "clay is -0.5 %, below 0");
    CHECK(problem(101.0, 0.0) == "sand is 101 %, above 100");
    CHECK(problem(kNone, 0.0) == "sand is not a finite number");
    CHECK(problem(1.0, kEndless) == "clay is not a finite number");
    CHECK(texture_of({70.0, 30.5}).hint == "silt is what sand and clay leave of 100 %");
    CHECK_FALSE(texture_of({70.0, 30.5}).value);
    CHECK(problem(70.0, 30.0).empty());
}

TEST_CASE("a texture is found by its name, forgivingly") {
    for (std::size_t i = 0; i < texture_names().size(); ++i) {
        const auto texture = static_cast<TextureClass>(i);
        CHECK(find_texture(texture_name(texture)) == texture);
    }
    CHECK(find_texture("Silty-Clay_LOAM") == TextureClass::silty_clay_loam);
    CHECK_FALSE(find_texture("loess"));
}

}  // namespace rainledger
