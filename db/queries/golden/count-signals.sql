select case when s.over_on is not null then 'over' when s.acknowledged_at is not null then 'acknowledged' else 'open' end as state, count(*) as n
from (select * from signals where branch_id in (select value from json_each(?))) as `s`
inner join `branches` on `branches`.`id` = `s`.`branch_id`
where (? = 1 or s.behind is null or (select count(*) from json_each(s.behind) as other where other.value not in (select value from json_each(?))) >= ?) and case when s.over_on is not null then 'over' when s.acknowledged_at is not null then 'acknowledged' else 'open' end in (select value from json_each(?))
group by 1;
