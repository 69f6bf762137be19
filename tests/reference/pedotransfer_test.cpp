#include "rainledger/reference/pedotransfer.hpp"

#include <limits>

#include "rainledger/reference/soil_texture.hpp"
#include "test.hpp"

namespace rainledger {
namespace {

constexpr double kNone = std::numeric_limits<double>::quiet_NaN();

}  // namespace

// Two regressions fitted apart: one straight to the suction, one to Brooks and Corey's parameters.
// That they meet is a check on the coefficients of both.
TEST_CASE("the two routes to a suction agree within 6 % inside the range of the regressions") {
    struct Middle {
        double sand, clay, porosity;
    };
    for (const Middle& soil : {Middle{65, 10, 0.453}, Middle{42, 18, 0.463}, Middle{20, 20, 0.501},
                               Middle{58, 27, 0.398}, Middle{32, 34, 0.464}, Middle{10, 34, 0.471},
                               Middle{52, 42, 0.430}, Middle{6, 47, 0.479}, Middle{22, 58, 0.475},
                               Middle{92, 5, 0.437}, Middle{82, 6, 0.437}}) {
        const auto answer = rawls_brakensiek_soil({soil.sand, soil.clay}, soil.porosity);
        REQUIRE(answer.value);
        CHECK_THAT(answer.value->suction_by_brooks_corey_mm,
                   WithinRel(answer.value->suction_mm, 0.06));
    }
}

// What a residual water content must be whatever its coefficients: held, and less than is held at
// 1500 kPa by the class means of Rawls, Brakensiek and Saxton (1982).
TEST_CASE("the residual content lies between nothing and the wilting point of the class") {
    struct Middle {
        double sand, clay, porosity;
        TextureClass texture;
    };
    using enum TextureClass;
    for (const Middle& soil :
         {Middle{65, 10, 0.453, sandy_loam}, Middle{42, 18, 0.463, loam},
          Middle{20, 20, 0.501, silt_loam}, Middle{58, 27, 0.398, sandy_clay_loam},
          Middle{32, 34, 0.464, clay_loam}, Middle{10, 34, 0.471, silty_clay_loam},
          Middle{52, 42, 0.430, sandy_clay}, Middle{6, 47, 0.479, silty_clay},
          Middle{22, 58, 0.475, clay}}) {
        INFO(texture_name(soil.texture));
        const auto answer = rawls_brakensiek_soil({soil.sand, soil.clay}, soil.porosity);
        REQUIRE(answer.value);
        CHECK(answer.value->residual_content > 0.0);
        CHECK(answer.value->residual_content <
              *soil_water_texture(soil.texture)->wilting_point.value);
    }
}

TEST_CASE("outside the soils of the source the regressions say so") {
    const auto caution = [](double sand, double clay) {
        return rawls_brakensiek_soil({sand, clay}, 0.45).value->caution;
    };
    CHECK(caution(42.0, 18.0).empty());
    CHECK(caution(69.9, 5.1).empty());
    CHECK(caution(70.0, 18.0) == "sand of 70 % lies outside 5 to 70 %: an extrapolation");
    CHECK(caution(30.0, 60.0) == "clay of 60 % lies outside 5 to 60 %: an extrapolation");
    CHECK(caution(92.0, 5.0) ==
          "sand of 92 % lies outside 5 to 70 %: an extrapolation; clay of 5 % lies outside 5 to "
          "60 %: an extrapolation");
}

TEST_CASE("regressions refuse what is no soil") {
    CHECK(rawls_brakensiek_soil({60.0, 41.0}, 0.45).problem ==
          "sand and clay together are 101 %, more than 100");
    for (const double porosity : {0.0, 1.0, -0.1, kNone})
        CHECK(rawls_brakensiek_soil({60.0, 20.0}, porosity).problem ==
              "porosity must lie between 0 and 1");
    CHECK(saxton_rawls_soil({60.0, kNone}, 2.5).problem == "clay is not a finite number");
    for (const double organic : {-0.1, 100.5, kNone})
        CHECK(saxton_rawls_soil({60.0, 20.0}, organic).problem ==
              "organic matter must lie between 0 and 100 %");
}

TEST_CASE("Saxton and Rawls caution outside their soils and refuse where their equations fail") {
    CHECK(saxton_rawls_soil({40.0, 20.0}, 2.5).value->caution.empty());
    CHECK(saxton_rawls_soil({20.0, 60.5}, 2.5).value->caution ==
          "clay of 60.5 % lies above 60 %: an extrapolation");
    CHECK(
        saxton_rawls_soil({40.0, 20.0}, 9.0).value->caution ==
        "organic matter of 9 % lies above 8 %: an extrapolation; the equation for air entry gives "
        "less than 0 and is left out");
    const auto failing = saxton_rawls_soil({10.0, 80.0}, 30.0);
    CHECK_FALSE(failing.value);
    CHECK(failing.problem ==
          "the equations of Saxton and Rawls give no soil here: water contents do not rise from "
          "1500 kPa to saturation");
    CHECK(failing.hint ==
          "clean sand without clay and organic matter, and heavy clay with much of it, lie beyond "
          "them");
}

TEST_CASE("over the soils of the source Saxton and Rawls give rising water contents") {
    for (int sand = 0; sand <= 100; sand += 5)
        for (int clay = 0; clay <= 60 && sand + clay <= 100; clay += 5)
            for (const double organic : {0.0, 2.5, 8.0}) {
                const auto answer = saxton_rawls_soil(
                    {static_cast<double>(sand), static_cast<double>(clay)}, organic);
                const bool clean = clay == 0 && organic == 0.0 && sand >= 60;
                const bool heavy = clay == 60 && organic == 8.0 && sand == 40;
                CHECK(answer.value.has_value() != (clean || heavy));
                if (!answer.value) continue;
                const SaxtonRawlsSoil& soil = *answer.value;
                CHECK(soil.wilting_point > 0.0);
                CHECK(soil.field_capacity > soil.wilting_point);
                CHECK(soil.saturation > soil.field_capacity);
                CHECK(soil.saturated_conductivity_mm_per_h > 0.0);
                CHECK(soil.air_entry_mm.has_value() == soil.caution.empty());
                CHECK(soil.air_entry_mm.value_or(0.0) >= 0.0);
            }
}

TEST_CASE("regressed soils show as rows") {
    const auto soil = saxton_rawls_soil({40.0, 20.0}, 2.5);
    const RowView view = view_of(*soil.value);
    CHECK(view.name == "Saxton and Rawls (2006)");
    CHECK(view.values.size() == 8);
    CHECK(view.values[6].key == "saturated_conductivity_mm_per_h");
    CHECK(*view.values[6].published.value == soil.value->saturated_conductivity_mm_per_h);
    CHECK(view_of(*rawls_brakensiek_soil({40.0, 20.0}, 0.45).value).values.size() == 6);
}

}  // namespace rainledger
