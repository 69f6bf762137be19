#include "rainledger/fieldtest/least_squares.hpp"

#include <cmath>
#include <limits>

#include "test.hpp"

namespace rainledger {
namespace {

/// y = a + b x on x = 1, 2, 3, ...
LeastSquaresProblem line(std::vector<double> observed) {
    LeastSquaresProblem problem;
    problem.observed = std::move(observed);
    problem.ranges.resize(2);
    problem.starts = {{1.0, 1.0}};
    problem.model = [](std::span<const double> p, std::span<double> values) {
        for (std::size_t i = 0; i < values.size(); ++i)
            values[i] = p[0] + p[1] * static_cast<double>(i + 1);
    };
    problem.slopes = [](std::span<const double> /*p*/, std::span<double> slopes) {
        for (std::size_t i = 0; 2 * i < slopes.size(); ++i) {
            slopes[2 * i] = 1.0;
            slopes[2 * i + 1] = static_cast<double>(i + 1);
        }
    };
    return problem;
}

LeastSquaresFit fit_of(const LeastSquaresProblem& problem) {
    const auto answer = fit_least_squares(problem);
    REQUIRE(answer.fit);
    CHECK(answer.problem.empty());
    return *answer.fit;
}

}  // namespace

TEST_CASE("a straight line is the textbook's") {
    // By hand: means 2.5 and 3.5, Sxx 5, Sxy 7, slope 1.4, intercept 0, residuals -0.4, 1.2, -1.2,
    // 0.4: sum of squares 3.2, variance 1.6, slope's error sqrt(1.6/5), covariance -1.6 2.5/5.
    const LeastSquaresFit fit = fit_of(line({1.0, 4.0, 3.0, 6.0}));
    CHECK_THAT(fit.parameters[0], WithinAbs(0.0, 1.0e-12));
    CHECK_THAT(fit.parameters[1], WithinRel(1.4, 1.0e-12));
    CHECK_THAT(fit.residual_sum, WithinRel(3.2, 1.0e-12));
    CHECK(fit.degrees_of_freedom == 2);
    CHECK_THAT(*fit.residual_deviation, WithinRel(std::sqrt(1.6), 1.0e-12));
    CHECK_THAT(*standard_error(fit, 1), WithinRel(std::sqrt(1.6 / 5.0), 1.0e-12));
    CHECK_THAT(fit.covariance[1], WithinRel(-0.8, 1.0e-12));
    CHECK_THAT(fit.covariance[2], WithinRel(-0.8, 1.0e-12));
    CHECK_THAT(fit.values[3], WithinRel(5.6, 1.0e-12));
    CHECK(fit.converged);
}

TEST_CASE("a parameter that wants to leave its range ends on the bound itself") {
    LeastSquaresProblem problem = line({4.0, 3.0, 3.0, 1.0});
    problem.ranges[1].low = 0.0;
    const LeastSquaresFit fit = fit_of(problem);
    CHECK(fit.standing[1] == Standing::at_low);
    CHECK(fit.parameters[1] == 0.0);
    CHECK_THAT(fit.parameters[0], WithinRel(2.75, 1.0e-12));
    CHECK(fit.degrees_of_freedom == 3);
    CHECK_FALSE(standard_error(fit, 1));
    CHECK_THAT(*standard_error(fit, 0), WithinRel(std::sqrt(4.75 / 3.0 / 4.0), 1.0e-12));
    CHECK(fit.covariance[1] == 0.0);
    CHECK(fit.covariance[3] == 0.0);
}

TEST_CASE("upper bounds and two bounds at once are tried") {
    LeastSquaresProblem problem = line({1.0, 4.0, 3.0, 6.0});
    problem.ranges = {{0.25, 2.0}, {0.0, 1.2}};
    const LeastSquaresFit fit = fit_of(problem);
    CHECK(fit.standing[0] == Standing::inside);
    CHECK(fit.standing[1] == Standing::at_high);
    CHECK_THAT(fit.parameters[0], WithinRel(0.5, 1.0e-12));
    problem.ranges[0] = {0.75, 2.0};
    CHECK(fit_of(problem).standing[1] == Standing::inside);
    problem.ranges = {{0.75, 2.0}, {0.0, 1.0}};
    CHECK(fit_of(problem).parameters == std::vector{1.0, 1.0});
}

TEST_CASE("a range of one value holds the parameter") {
    LeastSquaresProblem problem = line({1.0, 4.0, 3.0, 6.0});
    problem.ranges[0] = {1.0, 1.0};
    const LeastSquaresFit fit = fit_of(problem);
    CHECK(fit.parameters[0] == 1.0);
    CHECK_THAT(fit.parameters[1], WithinRel(32.0 / 30.0, 1.0e-12));
    CHECK(fit.degrees_of_freedom == 3);
}

TEST_CASE("the best of several starts is found, in whatever order they stand") {
    // (sin p - 1)^2 + (p/10 - 0.75)^2 has a hollow near each crest of the sine; the deepest lies
    // between the crest at 7.854 and 7.5, where cos p (sin p - 1) = (0.75 - p/10)/10, at 7.69598.
    LeastSquaresProblem problem;
    problem.observed = {1.0, 0.75};
    problem.ranges = {{-20.0, 20.0}};
    problem.model = [](std::span<const double> p, std::span<double> values) {
        values[0] = std::sin(p[0]);
        values[1] = p[0] / 10.0;
    };
    problem.slopes = [](std::span<const double> p, std::span<double> slopes) {
        slopes[0] = std::cos(p[0]);
        slopes[1] = 0.1;
    };
    problem.starts = {{1.0}, {7.0}, {-5.0}};
    const LeastSquaresFit fit = fit_of(problem);
    CHECK_THAT(fit.parameters[0], WithinAbs(7.695983, 1.0e-6));
    problem.starts = {{-5.0}, {1.0}, {7.0}};
    CHECK(fit_of(problem).parameters[0] == fit.parameters[0]);
}

TEST_CASE("parameters that the observations do not tell apart have no covariance") {
    LeastSquaresProblem problem = line({1.0, 4.0, 3.0, 6.0});
    problem.model = [](std::span<const double> p, std::span<double> values) {
        for (std::size_t i = 0; i < values.size(); ++i)
            values[i] = (p[0] + p[1]) * static_cast<double>(i + 1);
    };
    problem.slopes = [](std::span<const double> /*p*/, std::span<double> slopes) {
        for (std::size_t i = 0; i < slopes.size(); ++i)
            slopes[i] = static_cast<double>(i / 2 + 1);
    };
    const LeastSquaresFit fit = fit_of(problem);
    CHECK(fit.condition > 1.0e8);
    CHECK(fit.covariance.empty());
    CHECK_FALSE(standard_error(fit, 0));
    CHECK_THAT(fit.parameters[0] + fit.parameters[1], WithinRel(42.0 / 30.0, 1.0e-9));
}

TEST_CASE("as many observations as parameters leave no deviation") {
    const LeastSquaresFit fit = fit_of(line({1.0, 4.0}));
    CHECK(fit.degrees_of_freedom == 0);
    CHECK_FALSE(fit.residual_deviation);
    CHECK(fit.covariance.empty());
    CHECK_THAT(fit.parameters[1], WithinRel(3.0, 1.0e-9));
    CHECK(fit.converged);
}

TEST_CASE("what cannot be fitted is refused with its reason") {
    constexpr double kNaN = std::numeric_limits<double>::quiet_NaN();
    CHECK(fit_least_squares(line({1.0})).problem == "there are fewer observations than parameters");
    CHECK(fit_least_squares(line({1.0, kNaN, 2.0})).problem ==
          "an observation is not a finite number");
    LeastSquaresProblem problem = line({1.0, 4.0, 3.0});
    problem.starts = {{1.0, kNaN}};
    CHECK(fit_least_squares(problem).problem == "a start does not lie within the ranges");
    problem.starts = {{1.0}};
    CHECK(fit_least_squares(problem).problem == "a start does not lie within the ranges");
    problem.starts.clear();
    CHECK(fit_least_squares(problem).problem == "there is no start");
    problem = line({1.0, 4.0, 3.0});
    problem.model = [](std::span<const double> /*p*/, std::span<double> values) {
        values[0] = kNaN;
    };
    CHECK(fit_least_squares(problem).problem == "the model has no finite values at any start");
    problem = line({1.0, 4.0, 3.0, 5.0});
    problem.ranges.assign(4, {0.0, 1.0});
    problem.starts = {{0.5, 0.5, 0.5, 0.5}};
    CHECK(fit_least_squares(problem).problem == "there are more than 6 finite bounds");
}

}  // namespace rainledger
