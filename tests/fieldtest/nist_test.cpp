#include "fieldtest/nist.hpp"

#include "rainledger/fieldtest/least_squares.hpp"
#include "test.hpp"

// Digits that agree are counted as -log10 of the relative difference. The certified values carry
// eleven figures.
namespace rainledger {
namespace {

constexpr double kSixDigits = 5.0e-7;

LeastSquaresProblem problem_of(const nist::Dataset& set, const std::vector<double>& start) {
    LeastSquaresProblem problem;
    problem.observed = set.y;
    problem.ranges.resize(set.parameters.size());
    problem.starts = {start};
    problem.model = [&set](std::span<const double> b, std::span<double> values) {
        for (std::size_t i = 0; i < values.size(); ++i)
            values[i] = set.model(b, set.x[i]);
    };
    problem.slopes = [&set](std::span<const double> b, std::span<double> slopes) {
        for (std::size_t i = 0; i < set.x.size(); ++i)
            set.slopes(b, set.x[i], slopes.subspan(i * b.size(), b.size()));
    };
    return problem;
}

void check_certified(const nist::Dataset& set) {
    for (const auto& start : set.starts) {
        INFO(set.name << " from " << start[0]);
        const auto answer = fit_least_squares(problem_of(set, start));
        REQUIRE(answer.fit);
        CHECK(answer.fit->converged);
        CHECK_THAT(answer.fit->residual_sum, WithinRel(set.residual_sum, kSixDigits));
        for (std::size_t j = 0; j < set.parameters.size(); ++j) {
            INFO("parameter " << j + 1);
            CHECK_THAT(answer.fit->parameters[j], WithinRel(set.parameters[j], kSixDigits));
            REQUIRE(standard_error(*answer.fit, j));
            CHECK_THAT(*standard_error(*answer.fit, j), WithinRel(set.errors[j], kSixDigits));
        }
    }
}

}  // namespace

TEST_CASE("certified by NIST: Misra1a from both starts") {
    check_certified(nist::misra1a());
}

TEST_CASE("certified by NIST: BoxBOD from both starts") {
    check_certified(nist::box_bod());
}

TEST_CASE("certified by NIST: Rat43 from both starts") {
    check_certified(nist::rat43());
}

TEST_CASE("certified by NIST: Thurber from both starts") {
    check_certified(nist::thurber());
}

}  // namespace rainledger
